package stillwarden.cli;

/** How the answer is written. The names are what the user types. */
enum Format {
  text,
  json
}
