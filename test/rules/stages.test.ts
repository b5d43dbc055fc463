import { describe, expect, it } from 'vitest'
import { countPlaywright, countVitest, notRun, one, runStages } from '../../scripts/lib/stages.mjs'

describe('counting the checks of a stage', () => {
  it('counts what a report says', () => {
    expect(countVitest({ numPassedTests: 7, numFailedTests: 2 }, 1)).toEqual({ passed: 7, failed: 2 })
    expect(countPlaywright({ stats: { expected: 5, unexpected: 1 } }, 1)).toEqual({ passed: 5, failed: 1 })
  })

  it('takes a test that was skipped, planned or only passed at the second try for a failure', () => {
    expect(countVitest({ numPassedTests: 7, numPendingTests: 1, numTodoTests: 1 }, 0)).toEqual({
      passed: 7,
      failed: 2,
    })
    expect(countPlaywright({ stats: { expected: 5, flaky: 1, skipped: 2 } }, 0)).toEqual({
      passed: 5,
      failed: 3,
    })
  })

  it('takes a run without a report, without a test, or that broke off for a failure', () => {
    for (const count of [countVitest, countPlaywright])
      expect(count(undefined, 0)).toEqual({ passed: 0, failed: 1 })
    expect(countVitest({ numPassedTests: 0 }, 0)).toEqual({ passed: 0, failed: 1 })
    expect(countVitest({ numPassedTests: 3 }, 1)).toEqual({ passed: 3, failed: 1 })
    expect(countPlaywright({ stats: { expected: 0 } }, 0)).toEqual({ passed: 0, failed: 1 })
    expect(countPlaywright({ stats: { expected: 4 } }, 1)).toEqual({ passed: 4, failed: 1 })
  })
})

describe('runStages', () => {
  const said = async (stages: Parameters<typeof runStages>[0]) => {
    let text = ''
    const passed = await runStages(stages, (part: string) => {
      text += part
      return true
    })
    return { passed, text, last: text.trimEnd().split('\n').at(-1) }
  }
  const stage = (name: string, count: { passed: number; failed: number }, more = {}) => ({
    name,
    run: async () => count,
    ...more,
  })

  it('ends with the counts of all stages and says whether all passed', async () => {
    const good = await said([stage('a', one(true)), stage('b', { passed: 4, failed: 0 })])
    expect(good).toMatchObject({ passed: true, last: '5 passed, 0 failed' })
    const bad = await said([stage('a', one(false)), stage('b', { passed: 4, failed: 0 })])
    expect(bad).toMatchObject({ passed: false, last: '4 passed, 1 failed' })
  })

  it('goes on after a failure, but tries nothing that needs what failed', async () => {
    const { last, text } = await said([
      stage('build', one(false)),
      stage('end to end', { passed: 9, failed: 0 }, { needs: 'build' }),
      stage('other', one(true)),
    ])
    expect(text).toContain('end to end: not tried, as build failed')
    expect(last).toBe('1 passed, 2 failed')
  })

  it('counts a stage that throws as failed, and nothing at all as not passed', async () => {
    const broken = {
      name: 'broken',
      run: async () => {
        throw new Error('no disk')
      },
    }
    expect(await said([broken])).toMatchObject({ passed: false, last: '0 passed, 1 failed' })
    const nothing = await said([stage('PostgreSQL', notRun)])
    expect(nothing).toMatchObject({ passed: false, last: '0 passed, 0 failed' })
    expect(nothing.text).toContain('NOT RUN')
  })
})
