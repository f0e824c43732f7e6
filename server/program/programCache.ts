/** Compiled trees, kept in memory by the hashes of all that went into them. */
import type { Program } from '@/flows/machine/compile';

const MOST_PROGRAMS = 60;

export interface ProgramCache {
  /** The program of that key; `make` is asked when there is none. The longest unused one makes room. */
  get(key: string, make: () => Promise<Program>): Promise<Program>;
}

/** An empty cache. */
export function createProgramCache(): ProgramCache {
  const programs = new Map<string, Program>();
  return {
    get: async (key, make) => {
      const kept = programs.get(key);
      const program = kept ?? (await make());
      programs.delete(key);
      programs.set(key, program);
      if (programs.size > MOST_PROGRAMS) {
        const oldest = programs.keys().next();
        if (oldest.done !== true) programs.delete(oldest.value);
      }
      return program;
    },
  };
}
