import { z } from 'zod'

// Without this the schemas try to compile themselves, which the content policy reports as a violation.
z.config({ jitless: true })
