import { describe, expect, it } from 'vitest'
import { axisLabels } from '#client/components/charts/axis-labels.ts'

const plain = (labels: string[]) => labels.map((label) => label.replace('\u2009', ' '))

describe('axisLabels', () => {
  it('uses one prefix for the whole axis', () => {
    expect(plain(axisLabels([0, 0.02, 0.04], 's'))).toEqual(['0 ms', '20 ms', '40 ms'])
    expect(plain(axisLabels([0.9995, 1, 1.0005], 's'))).toEqual(['0.9995 s', '1.0000 s', '1.0005 s'])
  })

  it('writes as many decimals as tell neighbours apart', () => {
    expect(plain(axisLabels([0.1000001, 0.1000002, 0.1000003], 's'))).toEqual([
      '100.0001 ms',
      '100.0002 ms',
      '100.0003 ms',
    ])
    expect(plain(axisLabels([-4.5, 0, 4.5], 'V'))).toEqual(['\u22124.5 V', '0 V', '4.5 V'])
  })

  it('does not write minus zero', () => {
    expect(plain(axisLabels([-0.5, -1e-17, 0.5], 'V'))).toEqual(['\u2212500 mV', '0 mV', '500 mV'])
  })
})
