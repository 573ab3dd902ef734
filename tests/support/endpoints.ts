import { readdirSync, readFileSync } from 'node:fs';
import type { AnyEndpoint } from '@/shared/endpoint';

const isEndpoint = (value: unknown): value is AnyEndpoint =>
  typeof value === 'object' &&
  value !== null &&
  'method' in value &&
  'path' in value &&
  'needs' in value &&
  'output' in value;

export type Named = { name: string; line: AnyEndpoint };

/** Every endpoint of every contract, so that no test can miss one. */
export async function allEndpoints(): Promise<Named[]> {
  const files = readdirSync('shared', { recursive: true, encoding: 'utf8' }).filter(
    (name) => name.endsWith('.ts') && readFileSync(`shared/${name}`, 'utf8').includes('= endpoint({'),
  );
  const found: Named[] = [];
  for (const file of files.sort()) {
    const module: Record<string, unknown> = await import(`../../shared/${file}`);
    for (const [name, value] of Object.entries(module))
      if (isEndpoint(value)) found.push({ name: `${file.split('/')[0]}.${name}`, line: value });
  }
  return found;
}
