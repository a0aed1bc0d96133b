// What the operating system says about a file, in words for people.

const WORDS: Readonly<Record<string, string>> = {
  EACCES: 'permission denied',
  EPERM: 'permission denied',
  ENOENT: 'no such file or folder',
  ENOTDIR: 'no such file or folder',
  EISDIR: 'is a folder',
  ELOOP: 'links that lead in a circle',
  ENAMETOOLONG: 'the name is too long',
  ENOSPC: 'no space left on the disk',
  EDQUOT: 'no space left on the disk',
  EROFS: 'the disk is read-only',
  EMFILE: 'too many open files',
  EIO: 'the disk reports an error',
  EBUSY: 'in use by another program',
};

/** Words for an error of the operating system; undefined for any other error. */
export function systemComplaint(error: unknown): string | undefined {
  if (!(error instanceof Error) || !('code' in error) || typeof error.code !== 'string') return undefined;
  return WORDS[error.code];
}
