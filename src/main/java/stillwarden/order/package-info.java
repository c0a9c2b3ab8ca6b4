/** Findings come in, one ordered answer goes out: actions, bans, questions, verdict. Plain Java, no rule engine. */
package stillwarden.order;
