export function findBrowser(
  env?: Readonly<Record<string, string | undefined>>,
  platform?: NodeJS.Platform,
): string | null;
