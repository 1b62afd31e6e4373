import { IMPORT_MAX_BYTES } from '../../../../shared/applications/applications-contract';

export interface ChosenFile {
  fileName: string;
  /** The bytes in base64. */
  content: string;
}

/** Reads a chosen file; rejects with a sentence for the page where it is too large or cannot be read. */
export function readChosenFile(file: File): Promise<ChosenFile> {
  if (file.size > IMPORT_MAX_BYTES)
    return Promise.reject(new Error('The file is larger than 5 MB; split it and import the parts'));
  return new Promise((resolve, reject) => {
    const reader = new FileReader();
    reader.onerror = () => reject(new Error('The file could not be read; choose it again'));
    reader.onload = () => {
      const address = typeof reader.result === 'string' ? reader.result : '';
      resolve({ fileName: file.name, content: address.slice(address.indexOf(',') + 1) });
    };
    reader.readAsDataURL(file);
  });
}
