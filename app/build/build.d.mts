/** Bundles entries (name → path) for Node into a folder. */
export function bundleForNode(
  input: Readonly<Record<string, string>>,
  outDir: string,
): Promise<void>;
