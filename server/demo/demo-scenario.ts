import scenario from '@/server/demo/scenario.json';

export type DemoRole = 'contributor' | 'curator' | 'administrator';

export interface DemoScenario {
  /** An invented institute at which all three work. */
  institute: string;
  people: Record<DemoRole, { name: string; email: string }>;
  /** What the curator writes beside an acceptance. */
  acceptance: string;
}

/** The invented people of the demo content; their addresses end in `.example` and reach nobody. */
export const demoScenario: DemoScenario = scenario;
