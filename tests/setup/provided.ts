/** What the global set-ups hand to the tests through `inject`. */
export interface DemoSignIn { role: string; email: string; password: string }

declare module 'vitest' {
  export interface ProvidedContext {
    /** API and browser tests: a database of this run alone, with the tables in place. */
    databaseUrl: string
    /** Browser tests: where the product answers, without a slash at the end. */
    baseUrl: string
    demoSignIns: DemoSignIn[]
  }
}
