/** Address of a sheet of readings: 128 random bits in base64url, 22 characters. */
export type SheetId = string & { readonly __brand: 'SheetId' };

/** The form of a sheet as it was typed: what each field held. */
export type SheetFields = Readonly<Record<string, readonly string[]>>;
