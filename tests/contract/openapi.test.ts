import Ajv2020 from 'ajv/dist/2020';
import addFormats from 'ajv-formats';
import { openapiDocument } from '@/server/openapi/openapi-document';
import { operations } from '@/server/openapi/operations';
import { schemaDocuments } from '@/server/schema-registry';

interface Described {
  operationId: string;
  parameters?: { name: string; in: string; required?: boolean; schema: object }[];
  requestBody?: { content: Record<string, { schema: { $ref: string } }> };
  responses: Record<string, { description: string; content?: Record<string, { schema: object }> }>;
}

const document = openapiDocument('https://orbits.example') as {
  openapi: string;
  info: { title: string; version: string };
  paths: Record<string, Record<string, Described>>;
  components: { schemas: Record<string, object> };
  'x-problems': Record<string, { status: number; title: string }>;
};
const described = Object.entries(document.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method, operation })),
);

/** Every `$ref` anywhere below a value. */
function references(value: unknown): string[] {
  if (typeof value !== 'object' || value === null) return [];
  return Object.entries(value).flatMap(([member, child]) =>
    member === '$ref' ? [String(child)] : references(child as unknown),
  );
}

describe('the OpenAPI document', () => {
  it('has the members that OpenAPI 3.1 asks for', () => {
    expect(document.openapi).toMatch(/^3\.1\.\d+$/);
    expect(document.info).toMatchObject({ title: 'Ritornel', version: '1' });
    expect(described.length).toBe(operations.length);
    for (const { operation } of described) {
      for (const [status, response] of Object.entries(operation.responses)) {
        expect(status).toMatch(/^([1-5]\d\d|default)$/);
        expect(response.description).not.toBe('');
      }
    }
  });

  it('names every operation once', () => {
    const ids = described.map(({ operation }) => operation.operationId);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('refers only to schemas that it holds', () => {
    const targets = Object.keys(document.components.schemas).map((name) => `#/components/schemas/${name}`);
    expect(references(document).filter((reference) => !targets.includes(reference))).toEqual([]);
    expect(Object.keys(document.components.schemas)).toEqual([...schemaDocuments.keys()]);
  });

  it('holds schemas that compile and say the same as those that validate', () => {
    const ajv = new Ajv2020({ strict: false });
    addFormats(ajv);
    ajv.addSchema({ $id: 'openapi', components: document.components });
    for (const name of schemaDocuments.keys()) {
      expect(ajv.getSchema(`openapi#/components/schemas/${name}`)).toBeInstanceOf(Function);
    }
    const validate = ajv.getSchema('openapi#/components/schemas/submission-body')!;
    expect(validate({ system: 'lorenz', section: 'z-27', point: ['1', 2, '8/3'], period: '1.5' })).toBe(true);
    expect(validate({ system: 'lorenz', section: 'z-27', point: ['one'], period: '1.5' })).toBe(false);
  });

  it('describes every parameter of every path, and no other', () => {
    for (const { path, operation } of described) {
      const inPath = [...path.matchAll(/\{([^}]+)\}/g)].map(([, name]) => name);
      const told = (operation.parameters ?? []).filter((parameter) => parameter.in === 'path');
      expect(told.map(({ name }) => name)).toEqual(inPath);
      expect(told.every(({ required }) => required === true)).toBe(true);
    }
  });

  it('lists the problems that an operation may answer, by status', () => {
    const signIn = document.paths['/session']!['post']!;
    expect(signIn.responses['401']?.description).toContain('wrong-credentials');
    expect(signIn.responses['429']?.content).toHaveProperty(['application/problem+json']);
    expect(document['x-problems']['wrong-credentials']?.status).toBe(401);
  });
});
