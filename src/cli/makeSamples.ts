import { mkdir, writeFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { buildSamples } from '../demo/samples';

const folder = new URL('../../samples/', import.meta.url);

await mkdir(folder, { recursive: true });
for (const { name, bytes } of buildSamples()) {
  await writeFile(new URL(name, folder), bytes);
  console.log(`${fileURLToPath(new URL(name, folder))} (${bytes.length} bytes)`);
}
