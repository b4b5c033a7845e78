/** A file whose bytes are in storage already, with the checksum taken on the way. */
export interface StoredFile {
  /** As the author gave it, without folders or control characters. */
  name: string;
  /** Hexadecimal. */
  sha256: string;
  sizeBytes: number;
  storageKey: string;
}
