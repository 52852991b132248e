import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** One line of a table of section orbits; every number is its printed text, so that no digit is lost. */
export interface SectionOrbit {
  code: string;
  n: string;
  period: string;
  /** Lorenz: [x, y] at z = 27; Rössler: [x, z] at y = 0. */
  points: [string, string][];
  times: string[];
  /** Natural logarithms of the moduli of the two nontrivial multipliers, unstable first. */
  logAbsMultipliers: [string, string];
  signs: [string, string];
  partner?: string;
}

const JSON_NUMBER = /(?<=[:[,])-?\d[\d.eE+-]*(?=[\],}])/g;

function load(file: string): SectionOrbit[] {
  return readFileSync(join(__dirname, file), 'utf8')
    .split('\n')
    .filter((line) => line !== '')
    .map((line) => JSON.parse(line.replace(JSON_NUMBER, '"$&"')) as SectionOrbit);
}

/** The 745 Lorenz orbits of 2 to 12 returns. */
export const loadLorenzOrbits = (): SectionOrbit[] => load('lorenz-12.ndjson');

/** The 106 Rössler orbits of 1 to 12 returns. */
export const loadRosslerOrbits = (): SectionOrbit[] => load('rossler.ndjson');
