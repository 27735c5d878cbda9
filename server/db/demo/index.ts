/**
 * Fills an empty database with the invented scenario: people, projects, designs and runs of Brackwater Probes. Every
 * record and figure in it is computed by the engine while seeding.
 */
import type { Transaction } from 'sequelize'
import type { ComputedRun } from '#server/compute/index.ts'
import type { AppContext } from '#server/context.ts'
import { demoDesigns, demoProjects, type DemoDesignKey } from '#server/db/demo/designs.ts'
import { demoAccounts } from '#server/db/demo/accounts.ts'
import { demoRuns, type DemoRun } from '#server/db/demo/runs.ts'
import { designsRepository } from '#server/features/designs/repository.ts'
import { runsRepository } from '#server/features/runs/repository.ts'
import { hashPassword } from '#server/identity/passwords.ts'
import type { RunInputs } from '#shared/schemas/simulation.ts'

export { demoAccounts, type DemoAccount } from '#server/db/demo/accounts.ts'

/**
 * Seeds the demo into an empty database; false when there is anything in it already.
 * @throws Error in production, or when the engine cannot compute one of the runs
 */
export async function seedDemo(context: AppContext): Promise<boolean> {
  const { config, database, clock } = context
  if (config.mode !== 'demo') throw new Error('The demo is never seeded in production.')
  const { models } = database
  const inUse = async (transaction?: Transaction) => (await models.Person.count({ transaction })) > 0
  if (await inUse()) return false
  const [hashes, computed] = await Promise.all([
    hashPasswords(config.bcryptCost),
    Promise.all(demoRuns.map((run) => compute(context, run))),
  ])
  return database.write(async (transaction) => {
    if (await inUse(transaction)) return false
    const now = clock()
    const stamps = { createdAt: now, updatedAt: now }

    const people = await models.Person.bulkCreate(
      demoAccounts.map(({ name, email, role, password }) => ({
        name,
        email,
        role,
        passwordHash: hashes.get(password)!,
        demo: true,
        ...stamps,
      })),
      { transaction },
    )
    const person = new Map(people.map((row) => [row.email, row]))
    const projects = await models.Project.bulkCreate(
      Object.values(demoProjects).map((name) => ({ name, ...stamps })),
      { transaction },
    )
    const projectId = new Map(projects.map(({ name, id }) => [name, id]))

    const designs = designsRepository(context)
    const designId = new Map<DemoDesignKey, number>()
    for (const { key, project, name, author, content } of demoDesigns) {
      const body = { projectId: projectId.get(project)!, name, content }
      designId.set(key, await designs.create(body, person.get(author)!, now, transaction))
    }

    const runs = runsRepository(context)
    for (const [index, { design, author, title, note }] of demoRuns.entries()) {
      const { inputs, result } = computed[index]!
      const body = { designId: designId.get(design)!, title, note, inputs }
      await runs.create(body, result, person.get(author)!.id, now, transaction)
    }
    return true
  })
}

/** The accounts of one role share a password, and so its hash: hashing is slow on purpose. */
async function hashPasswords(cost: number): Promise<Map<string, string>> {
  const passwords = [...new Set(demoAccounts.map(({ password }) => password))]
  return new Map(
    await Promise.all(
      passwords.map(async (password) => [password, await hashPassword(password, cost)] as const),
    ),
  )
}

/** The inputs of a demo run, and what the engine makes of them. */
async function compute(
  { compute: pool }: AppContext,
  run: DemoRun,
): Promise<{ inputs: RunInputs; result: ComputedRun }> {
  const { circuit, stimulus, timing } = demoDesigns.find(({ key }) => key === run.design)!.content
  const draft = { circuit, stimulus, timing }
  const inputs = run.change?.(draft) ?? draft
  const result = await pool.run(inputs)
  if (result.kind !== 'computed') throw new Error(`The demo run "${run.title}": ${result.sentence}`)
  return { inputs, result }
}
