/** A live run: judged again on each observation and as time passes, at the cost of what changed. */
package stillwarden.watch;
