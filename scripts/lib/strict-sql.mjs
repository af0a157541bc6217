/** @param {string} sql @returns {string} the same statements, each CREATE TABLE closed with STRICT (running it twice changes nothing) */
export function toStrict(sql) {
  return sql
    .split("--> statement-breakpoint")
    .map((statement) => (/^\s*CREATE TABLE\s/i.test(statement) ? statement.replace(/\)\s*;(\s*)$/, ") STRICT;$1") : statement))
    .join("--> statement-breakpoint");
}
