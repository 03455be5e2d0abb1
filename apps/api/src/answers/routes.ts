import type { Handlers } from '../http/call'
import type { AnswersService } from './service'

export const answerRoutes = (answers: AnswersService) =>
  ({
    ask: ({ scope, body }) => answers.ask(scope, body.question),
  }) satisfies Handlers
