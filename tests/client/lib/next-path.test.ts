/** Open redirects: CWE-601. The list holds the usual tricks (from memory). */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { safeNext, signInPath } from '#client/lib/next-path.ts'

describe('safeNext', () => {
  it.each([
    '/designs/7/start-up',
    '/runs?designId=7&page=2',
    '/designs/7/tone?from=0.01&to=0.02',
    '/account#page',
  ])('follows %s', (path) => expect(safeNext(path)).toBe(path))

  it.each([
    null,
    '',
    'https://elsewhere.example/',
    '//elsewhere.example/',
    '/\\elsewhere.example/',
    '\\\\elsewhere.example',
    '/\t/elsewhere.example',
    '/.//elsewhere.example',
    'javascript:alert(1)',
    'data:text/html,x',
    'designs',
    ' /designs/7',
    '/sign-in?next=/sign-in',
  ])('does not follow %j', (path) => expect(safeNext(path)).toBe('/designs'))

  it('never leaves the origin, whatever the text', () => {
    const origin = 'https://sinewright.example'
    const pieces = fc.array(
      fc.constantFrom(
        '/',
        '\\',
        '.',
        '..',
        ':',
        '@',
        '?',
        '#',
        '\t',
        '\n',
        'x.example',
        'https:',
        '%2f',
        ' ',
      ),
    )
    fc.assert(
      fc.property(pieces, (parts) => {
        expect(new URL(safeNext(`/${parts.join('')}`), origin).origin).toBe(origin)
      }),
    )
  })
})

describe('signInPath', () => {
  it('leads back to where one was, and says nothing of the home page', () => {
    const path = '/runs?designId=7&page=2'
    expect(safeNext(new URLSearchParams(signInPath(path).split('?')[1]).get('next'))).toBe(path)
    expect(signInPath('/designs')).toBe('/sign-in')
  })
})
