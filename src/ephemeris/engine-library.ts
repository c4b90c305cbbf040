import { ApsidaryError } from "../error.ts";

/** The package astronomy-engine (D. Cross), as loaded. */
export type EngineLibrary = typeof import("astronomy-engine");

/**
 * Loads astronomy-engine; the second call gives the same module.
 *
 * Bundlers and Node hand over its names at the top or under `default`; both are taken.
 *
 * @throws ApsidaryError `unreadable` where it cannot be loaded
 */
export async function engineLibrary(): Promise<EngineLibrary> {
  try {
    const loaded: EngineLibrary | { readonly default: EngineLibrary } = await import("astronomy-engine");
    return "AstroTime" in loaded ? loaded : loaded.default;
  } catch (error) {
    throw new ApsidaryError(
      "unreadable",
      `astronomy-engine cannot be loaded (${error instanceof Error ? error.message : String(error)}); ` +
        "install it (in Node from 20.19 on), or do without it by `engine: false`.",
    );
  }
}
