import { z } from "zod";
import { problem } from "../../shared/contract/problem";
import { type Answer, type NamedSchema, type Operation, operationId } from "./api";

type Json = Record<string, unknown>;

const problemSchema: NamedSchema = { name: "Problem", schema: problem };
const bodyAnswers: Record<number, Answer> = {
  400: { description: "Not valid JSON (malformed-json)." },
  413: { description: "Larger than 2 MB (too-large)." },
  415: { description: "Not sent as JSON (unsupported-media-type)." },
  422: {
    description: "Does not fit the schema (invalid), or refers to something not in this account (unknown-reference).",
  },
};
const queryAnswers: Record<number, Answer> = {
  422: { description: "What stands behind the question mark does not fit the schema (invalid)." },
};
const signedInAnswers: Record<number, Answer> = { 401: { description: "No valid access token (no-session)." } };

/** What OpenAPI 3.1 calls the API: every operation that was registered, with schemas made from the contracts. */
export interface OpenApiDocument {
  openapi: "3.1.0";
  info: { title: string; version: string; description: string };
  servers: { url: string }[];
  tags: { name: string }[];
  paths: Record<string, Record<string, DescribedOperation>>;
  components: { schemas: Record<string, Json>; securitySchemes: Record<string, Json> };
}

export interface DescribedOperation {
  operationId: string;
  tags: string[];
  summary: string;
  security: Record<string, never[]>[];
  parameters?: Json[];
  requestBody?: { required: true; content: Json };
  responses: Record<string, { description: string; content?: Json }>;
}

export function openApiDocument(operations: readonly Operation[]): OpenApiDocument {
  const schemas: Record<string, Json> = {};
  const reference = ({ name, schema }: NamedSchema): Json => {
    if (!Object.hasOwn(schemas, name)) {
      const { $schema: _dialect, ...definition } = z.toJSONSchema(schema, { io: "input" });
      schemas[name] = definition;
    }
    return { $ref: `#/components/schemas/${name}` };
  };
  const content = (schema: Json): Json => ({ "application/json": { schema } });

  const describe = (operation: Operation): DescribedOperation => {
    const answers = {
      ...(operation.signedIn ? signedInAnswers : {}),
      ...(operation.query ? queryAnswers : {}),
      ...(operation.body ? bodyAnswers : {}),
      ...operation.answers,
    };
    const responses = Object.entries(answers).map(([status, answer]) => {
      const schema = answer.schema ?? (Number(status) >= 400 ? problemSchema : null);
      const { description, list, mediaType } = answer;
      const body = schema && (list ? { type: "array", items: reference(schema) } : reference(schema));
      const sent = mediaType ? { [mediaType]: {} } : body && content(body);
      return [status, { description, ...(sent ? { content: sent } : {}) }] as const;
    });
    const parameters = [...pathParameters(operation), ...queryParameters(operation)];
    return {
      operationId: operationId(operation),
      tags: [operation.tag],
      summary: operation.summary,
      security: operation.signedIn ? [{ accessToken: [] }] : [],
      ...(parameters.length > 0 ? { parameters } : {}),
      ...(operation.body ? { requestBody: { required: true, content: content(reference(operation.body)) } } : {}),
      responses: Object.fromEntries(responses),
    };
  };

  const paths: OpenApiDocument["paths"] = {};
  for (const operation of operations) {
    const path = operation.path.replace(/:(\w+)/g, "{$1}");
    paths[path] = { ...paths[path], [operation.method]: describe(operation) };
  }
  return {
    openapi: "3.1.0",
    info: {
      title: "Larkspan",
      version: "1",
      description:
        "Voices, songs, keys and instruments of people who sing while they play. Sign in for an access token, which lasts ten minutes; exchange the refresh cookie for the next.",
    },
    servers: [{ url: "/api" }],
    tags: [...new Set(operations.map((operation) => operation.tag))].map((name) => ({ name })),
    paths,
    components: { schemas, securitySchemes: { accessToken: { type: "http", scheme: "bearer", bearerFormat: "JWT" } } },
  };
}

function pathParameters({ path }: Operation): Json[] {
  const names = [...path.matchAll(/:(\w+)/g)].map(([, name]) => name);
  return names.map((name) => ({
    name,
    in: "path",
    required: true,
    schema: { type: "string", ...(name === "token" ? {} : { format: "uuid" }) },
  }));
}

function queryParameters({ query }: Operation): Json[] {
  if (!query) return [];
  const { properties = {}, required = [] } = z.toJSONSchema(query, { io: "input" });
  return Object.entries(properties).map(([name, schema]) => ({
    name,
    in: "query",
    required: required.includes(name),
    schema,
  }));
}
