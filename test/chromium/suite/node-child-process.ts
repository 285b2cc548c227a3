/** A page starts no process: as on a machine without Python, the tests that need it are skipped. */
export function spawnSync(): { readonly status: null } {
  return { status: null };
}

/** Never reached, since nothing that would call it is run. */
export function execFileSync(path: string): never {
  throw new Error(`a page cannot start ${path}`);
}
