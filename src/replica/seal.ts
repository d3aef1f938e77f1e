/**
 * What stands between the replica and what is stored of a person. Sealing is done before a transaction opens. Values are
 * plain data; a picture's bytes in it are a Uint8Array.
 */
export interface Seal {
  seal(value: unknown): Promise<unknown>;
  /** Rejects where `stored` cannot be opened. */
  open(stored: unknown): Promise<unknown>;
}

/** Stores values as they are. */
export const unsealed: Seal = {
  seal: async (value) => value,
  open: async (stored) => stored,
};
