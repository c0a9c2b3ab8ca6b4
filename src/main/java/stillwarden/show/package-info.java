/** An answer comes in, text or JSON goes out. Views that decide nothing. */
package stillwarden.show;
