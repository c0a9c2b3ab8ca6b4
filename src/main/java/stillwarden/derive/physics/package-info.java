/** Rig, policy and log lines come in; numbers with bands and side facts go out. SI doubles inside (K, Pa, m3, kg, W, s). */
package stillwarden.derive.physics;
