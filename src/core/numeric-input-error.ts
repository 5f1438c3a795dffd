/**
 * Wrong input to a numeric function: names the function, the parameter, the value and what is allowed.
 * It knows nothing of transport; an edge turns it into its own answer.
 */
export class NumericInputError extends Error {
  readonly functionName: string;
  readonly parameter: string;
  readonly value: unknown;
  readonly range: string;

  constructor(functionName: string, parameter: string, value: unknown, range: string) {
    super(`${functionName}: ${parameter} = ${shown(value)}, allowed: ${range}`);
    this.name = 'NumericInputError';
    this.functionName = functionName;
    this.parameter = parameter;
    this.value = value;
    this.range = range;
  }
}

function shown(value: unknown): string {
  if (typeof value === 'number') return String(value);
  const text = JSON.stringify(value) ?? 'nothing';
  return text.length > 80 ? `${text.slice(0, 77)}...` : text;
}
