/** The command line: streams in, exit status out. Wiring only. */
package stillwarden.cli;
