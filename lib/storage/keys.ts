const SEGMENT = /^[0-9a-z][0-9a-z._-]{0,99}$/;

/** Refuses what could name a place outside the store. */
export function requireKey(key: string): string {
  const segments = key.split('/');
  const isSound =
    segments.length <= 12 && segments.every((segment) => SEGMENT.test(segment) && !segment.includes('..'));
  if (!isSound) throw new Error('a storage key is lower-case words joined by slashes');
  return key;
}

export const photoKey = (firmId: string, photoId: string, size: 'original' | '1600' | '480') =>
  `firm/${firmId}/photo/${photoId}/${size}`;
export const reportKey = (firmId: string, reportVersionId: string, locale: string, renderer: string) =>
  `firm/${firmId}/report/${reportVersionId}/${locale}/${renderer}.pdf`;
export const logoKey = (firmId: string, sha256: string) => `firm/${firmId}/logo/${sha256}`;
export const signatureKey = (firmId: string, membershipId: string, sha256: string) =>
  `firm/${firmId}/signature/${membershipId}/${sha256}`;
