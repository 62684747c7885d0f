import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The project's folder, wherever it was cloned to. */
export const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..');
export const inRoot = (...parts) => join(root, ...parts);
export const bin = (name) => inRoot('node_modules', '.bin', name);
