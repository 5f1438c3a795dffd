const MOST_STATEMENTS = 500;
const MOST_ARGUMENTS = 60;

/**
 * Names under which connections keep statements prepared, so that the database parses and plans each once: the same
 * text always gets the same name. Lists of many values are sent whole, and so is everything once 500 texts have a name
 * (each costs memory on every connection): their name is ''.
 */
export function statementNames(): (statement: { sql: string; args: readonly unknown[] }) => string {
  const names = new Map<string, string>();
  return ({ sql, args }) => {
    const known = names.get(sql);
    if (known !== undefined) return known;
    if (args.length > MOST_ARGUMENTS || names.size >= MOST_STATEMENTS) return '';
    const name = `loadweir_${names.size + 1}`;
    names.set(sql, name);
    return name;
  };
}
