import type { Operation, OperationAnswer, OperationParameter } from '@/server/openapi/operation';
import { operations } from '@/server/openapi/operations';
import { type ProblemCode, problemCodes } from '@/server/problem-codes';
import { schemaDocuments } from '@/server/schema-registry';

type Json = Readonly<Record<string, unknown>>;

/** The API as an OpenAPI 3.1 document, made of the operations and of the schemas that validate. */
export function openapiDocument(publicUrl: string): Json {
  return {
    openapi: '3.1.0',
    info: {
      title: 'Ritornel',
      version: '1',
      summary: 'A checked archive of periodic orbits of flows found via Poincaré sections.',
      description:
        'Numbers of orbits are decimal strings. Entries are numerical results of idealised models: nothing here is cleared ' +
        'for the operation of a vehicle, machine or plant; follow local codes and licensed practice.',
      license: { name: 'MIT', identifier: 'MIT' },
    },
    servers: [{ url: `${publicUrl}/api/v1` }],
    paths: paths(),
    components: {
      schemas: componentSchemas(),
      securitySchemes: { signIn: { type: 'apiKey', in: 'cookie', name: 'ritornel.sign-in' } },
    },
    'x-problems': problemCodes,
  };
}

function paths(): Json {
  const described: Record<string, Record<string, Json>> = {};
  for (const operation of operations) {
    const path = operation.path.replaceAll(/:([A-Za-z]+)/g, '{$1}');
    (described[path] ??= {})[operation.method] = describe(operation);
  }
  return described;
}

function describe(operation: Operation): Json {
  return {
    operationId: operation.id,
    summary: operation.summary,
    ...(operation.description ? { description: operation.description } : {}),
    // Whoever is signed in may do more; only some calls ask for it.
    security: operation.role ? [{ signIn: [] }] : [{}, { signIn: [] }],
    ...(operation.role ? { 'x-role': operation.role } : {}),
    ...(operation.parameters?.length ? { parameters: operation.parameters.map(parameter) } : {}),
    ...(operation.body ? { requestBody: { required: true, content: json(reference(operation.body)) } } : {}),
    responses: { ...answers(operation.answers), ...problems(operation.problems) },
  };
}

const parameter = (given: OperationParameter): Json => ({
  ...given,
  ...(given.in === 'path' ? { required: true } : {}),
  ...(given.schema['type'] === 'object' ? { style: 'deepObject', explode: true } : {}),
});

function answers(given: readonly OperationAnswer[]): Json {
  return Object.fromEntries(
    given.map(({ status, description, schema, itemsOf, media }) => {
      const list = itemsOf && {
        type: 'object',
        required: ['items'],
        properties: { items: { type: 'array', items: reference(itemsOf) } },
      };
      const body = schema ? reference(schema) : list;
      const content = {
        ...(body ? json(body) : {}),
        ...Object.fromEntries((media ?? []).map((type) => [type, { schema: { type: 'string' } }])),
      };
      return [String(status), { description, ...(Object.keys(content).length > 0 ? { content } : {}) }];
    }),
  );
}

/** Problems by status; each names the codes that it may carry. */
function problems(codes: readonly ProblemCode[]): Json {
  const byStatus = new Map<number, ProblemCode[]>();
  for (const code of codes) {
    const { status } = problemCodes[code];
    byStatus.set(status, [...(byStatus.get(status) ?? []), code]);
  }
  return Object.fromEntries([
    ...[...byStatus].map(([status, listed]) => [String(status), problem(listed.join(', '))] as const),
    ['default', problem('Any other refusal.')],
  ]);
}

const problem = (description: string): Json => ({
  description,
  content: { 'application/problem+json': { schema: reference('problem') } },
});

const json = (schema: Json): Json => ({ 'application/json': { schema } });

const reference = (name: string): Json => ({ $ref: `#/components/schemas/${name}` });

/** The contract's schemas under their names, their references turned towards each other. */
function componentSchemas(): Json {
  return Object.fromEntries(
    [...schemaDocuments].map(([name, { $id: _id, $schema: _dialect, ...schema }]) => [
      name,
      withLocalReferences(schema),
    ]),
  );
}

function withLocalReferences(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(withLocalReferences);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value).map(([member, child]) =>
      member === '$ref' && typeof child === 'string'
        ? [member, reference(child.replace(/\.schema\.json$/, ''))['$ref']]
        : [member, withLocalReferences(child)],
    ),
  );
}
