/** Why an area file was refused. The message is meant for the person who chose the file. */
export type AreaImportCode =
  'file-missing' | 'wrong-format' | 'truncated' | 'empty' | 'roadless' | 'bad-name';

export class AreaImportError extends Error {
  readonly code: AreaImportCode;

  constructor(code: AreaImportCode, message: string, options?: ErrorOptions) {
    super(message, options);
    this.name = 'AreaImportError';
    this.code = code;
  }
}
