/** Facts come in; numbers with bands and signs (small qualitative facts) go out. Pure arithmetic, graph and time. */
package stillwarden.derive;
