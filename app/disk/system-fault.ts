// What the operating system refused, in words that help: one place for every read and write.

import type { Fault } from '../../weather/index.ts';

const known: Readonly<Record<string, readonly [found: string, mend: string]>> = {
  ENOENT: ['nothing at this path', 'Check the spelling and the folder.'],
  ENOTDIR: ['a file where a folder is named', 'Check the path: one of its folders is a file.'],
  EISDIR: ['a folder', 'Name a file in it.'],
  EACCES: ['no permission', 'Ask for the right to it, or choose another place.'],
  EPERM: ['no permission', 'Ask for the right to it, or choose another place.'],
  EROFS: ['a disk that can only be read', 'Choose another place.'],
  ENOSPC: ['a full disk', 'Free some space, or choose another disk.'],
  EDQUOT: ['a used-up quota', 'Free some space, or choose another disk.'],
  ENAMETOOLONG: ['a name that is too long for the disk', 'Shorten it.'],
  ELOOP: ['a link that leads back to itself', 'Name the file that it should lead to.'],
  EEXIST: ['something at this path already', 'Choose another name.'],
};

/** The code that Node gives a refusal, or null when the error is none of the system's. */
export function systemCode(error: unknown): string | null {
  const code = error instanceof Error && 'code' in error ? error.code : null;
  return typeof code === 'string' ? code : null;
}

/**
 * A refusal of the system as a fault of the path. An error without a system code is ours and is thrown
 * on.
 */
export function systemFault(file: string, error: unknown, expected: string): Fault {
  const code = systemCode(error);
  if (code === null) throw error;
  const [found, mend] = known[code] ?? [
    `the system's answer ${code}`,
    'Check the path and the disk.',
  ];
  return { file, place: { path: '' }, found, expected, mend };
}
