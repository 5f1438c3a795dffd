/** DI token of the environment as it was read at the start: `@Inject(ENV) env: Env`. */
export const ENV = Symbol('loadweir:env');
