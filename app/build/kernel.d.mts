/** Compiles the solver’s kernel; gives its bytes. */
export function compileKernel(): Promise<Uint8Array>;
