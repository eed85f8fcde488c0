import type { Problem } from '../../terms/problem.ts';

const passwordOf = (url: string): string | null => {
  try {
    return decodeURIComponent(new URL(url).password);
  } catch {
    return null; // no address at all, which is said elsewhere
  }
};

/** The same problem without the address or its password, should the driver have quoted one. */
export const masked = (found: Problem, url: string): Problem => {
  const secrets = [url, passwordOf(url) ?? ''].filter((secret) => secret !== '');
  const message = secrets.reduce((shown, secret) => shown.replaceAll(secret, '(not shown)'), found.message);
  return { ...found, message };
};
