/** Signs come in, findings (statements with rule, hazard and matched facts) go out. The only package that sees the rule engine. */
package stillwarden.judge;
