declare namespace NodeJS {
  interface ProcessEnv {
    /** Set by Next, which leaves out of a bundle what stands behind it where it does not hold. */
    readonly NEXT_RUNTIME?: 'nodejs' | 'edge';
  }
}
