/** Starts the browser application. */
import { z } from 'zod'
import './styles.css'

// Before any schema is made: the content security policy forbids `new Function`, which zod would otherwise probe.
z.config({ jitless: true })

const root = document.getElementById('root')
if (!root) throw new Error('index.html has no #root')

const { start } = await import('#client/app/start.tsx')
start(root)
