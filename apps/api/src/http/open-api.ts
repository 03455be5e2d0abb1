import { OpenAPIRegistry, OpenApiGeneratorV31 } from '@asteasolutions/zod-to-openapi'
import { PROBLEM_CONTENT_TYPE, problemDocument, ROUTES, type Route } from '@coaxwain/contract'
import { z } from 'zod'

const METHODS = {
  GET: 'get',
  POST: 'post',
  PUT: 'put',
  PATCH: 'patch',
  DELETE: 'delete',
} as const

type Schema = Record<string, unknown>

/** What comes in and what goes out differ where text becomes a number. */
const toJsonSchema = (schema: z.ZodType, io: 'input' | 'output'): Schema =>
  z.toJSONSchema(schema, { io, unrepresentable: 'any', target: 'draft-2020-12' })

const content = (schema: z.ZodType, io: 'input' | 'output', type = 'application/json') => ({
  content: { [type]: { schema: toJsonSchema(schema, io) } },
})

function parameters(route: Route): Schema[] {
  const of = (where: 'path' | 'query', schema: z.ZodType): Schema[] => {
    const { properties = {}, required = [] } = toJsonSchema(schema, 'input') as {
      properties?: Record<string, Schema>
      required?: string[]
    }
    return Object.entries(properties).map(([name, found]) => ({
      name,
      in: where,
      required: where === 'path' || required.includes(name),
      schema: found,
    }))
  }
  const version = {
    name: 'If-Match',
    in: 'header',
    required: true,
    schema: { type: 'string', examples: ['"1"'] },
  }
  return [
    ...of('path', route.params),
    ...of('query', route.query),
    ...(route.ifMatch ? [version] : []),
  ]
}

/** An OpenAPI 3.1 description of the table of routes. */
export function openApiDocument(root: string): object {
  const registry = new OpenAPIRegistry()
  for (const [name, route] of Object.entries(ROUTES) as [string, Route][]) {
    registry.registerPath({
      method: METHODS[route.method],
      path: root + route.path.replace(/:(\w+)/g, '{$1}'),
      operationId: name,
      summary: route.summary,
      tags: [route.path.replace('/collections/:collection/', '/').split('/')[1] ?? ''],
      description: `For: ${route.who}`,
      parameters: parameters(route) as never,
      ...(route.body === null ? {} : { request: { body: content(route.body, 'input') } }),
      responses: {
        [route.status]: {
          description: route.summary,
          ...(route.reply === null ? {} : content(route.reply, 'output')),
        },
        default: {
          description: 'A problem',
          ...(content(problemDocument, 'output', PROBLEM_CONTENT_TYPE) as object),
        },
      },
    })
  }
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: { title: 'Coaxwain', version: '1' },
  })
}
