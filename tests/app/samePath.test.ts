import { describe, expect, it } from 'vitest'
import { samePath, signInPath } from '../../app/shell/samePath'

describe('where signing in leads', () => {
  it.each([
    ['/', '/'],
    ['/budgets/abc?line=l1#x', '/budgets/abc?line=l1#x'],
    ['/people', '/people'],
  ])('to a path of this site: %s', (wanted, path) => {
    expect(samePath(wanted)).toBe(path)
  })

  // Outside source: WHATWG URL Standard, 'special' schemes read '\\' as '/', and tabs and line breaks are dropped.
  it.each([
    'https://other.example/',
    '//other.example/',
    '///other.example/',
    '/\\other.example/',
    '\\\\other.example',
    '/\t/other.example',
    '/\n/other.example',
    ' /people',
    'javascript:alert(1)',
    'people',
    '',
    '/.//other.example',
    '/a/..//other.example',
    '/sign-in?to=/sign-in',
    '/api/v1/session',
  ])('never elsewhere: %j', (wanted) => {
    const path = samePath(wanted)
    expect(path).toBe('/')
    expect(new URL(path, 'http://same.site').host).toBe('same.site')
  })

  it('takes no lists and nothing at all', () => {
    expect(samePath(undefined)).toBe('/')
    expect(samePath(['/people', '/new'])).toBe('/')
  })

  it('survives the way through the address of the sign-in page', () => {
    const address = new URL(signInPath('/budgets/b1?line=l1&x=2'), 'http://same.site')
    expect(samePath(address.searchParams.get('to') ?? undefined)).toBe('/budgets/b1?line=l1&x=2')
    expect(signInPath('/')).toBe('/sign-in')
  })
})
