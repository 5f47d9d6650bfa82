interface LockEntry {
  readonly version?: string;
  readonly integrity?: string;
  readonly optional?: boolean;
  readonly os?: readonly string[];
  readonly cpu?: readonly string[];
}
type Lock = Readonly<Record<string, LockEntry>> | null;

/** True where every package of the lock file is installed in its version. */
export function packagesMatch(wanted: Lock, installed: Lock): boolean;
export function packagesAreInstalled(folder?: string): boolean;
