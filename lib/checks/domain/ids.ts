/** Address of a visitor's check: 128 random bits in base64url, 22 characters. */
export type CheckId = string & { readonly __brand: 'CheckId' };

/** Address of a dated copy: SHA-256 of its canonical text, in hexadecimal. */
export type CopyHash = string & { readonly __brand: 'CopyHash' };
