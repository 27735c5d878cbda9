/** The thread that computes, so that the page never waits. Its owner is `engine-client.ts`. */
import { expose } from 'comlink'
import { z } from 'zod'
import { engineService } from '#client/workers/engine-service.ts'

// The content security policy forbids `new Function`, which zod would otherwise probe.
z.config({ jitless: true })

expose(engineService)
