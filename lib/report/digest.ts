// Digests for the content-security policy, by the web's own cryptography.

/** SHA-256 of a text in UTF-8 in base 64, as a content-security policy names it. */
export async function policyDigest(text: string): Promise<string> {
  const digest = await crypto.subtle.digest("SHA-256", new TextEncoder().encode(text));
  return btoa(String.fromCharCode(...new Uint8Array(digest)));
}
