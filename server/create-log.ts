import pino, { type DestinationStream, type Logger } from 'pino'

/**
 * The server's log: one JSON object a line. What is logged of a request is chosen in `http/request-log.ts`; this removes
 * what might slip in with a logged error or object.
 */
export const createLog = (level: string, destination?: DestinationStream): Logger =>
  pino(
    {
      level,
      base: null,
      redact: {
        paths: [
          ...[
            'password',
            'token',
            'code',
            'cookie',
            'authorization',
            'email',
            'name',
            'notes',
            'text',
          ].flatMap((key) => [`body.${key}`, `params.${key}`, `headers.${key}`]),
          'err.parameters',
          'err.detail',
          'err.where',
        ],
        censor: '…',
      },
    },
    destination,
  )
