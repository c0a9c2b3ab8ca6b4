/** What the user told us: files come in, immutable facts go out. The only readers of files. */
package stillwarden.describe;
