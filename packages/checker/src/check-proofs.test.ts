import type { Proof, Signal } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { checkProofs } from './check-proofs'
import { laid, straight, unitIn, type Rig } from './test-rig'

const VIDEO = { jack: 'video-out', port: 'video-out' } as const
const LEFT = { jack: 'sound-out', port: 'sound-out-l' } as const
const ABOUT = { format: 1, unit: 'player', avoid: [] } as const

/** The player's picture is untried, and what is claimed of it fits. */
function untried(): Rig {
  const rig = straight()
  const player = unitIn(rig, 'player')
  player.forms = player.forms.filter((f) => f.jack !== VIDEO.jack)
  rig.hookup.axes.doubt = 1
  return rig
}

const trial = (rig: Rig, seen: readonly Signal[], heard: readonly Signal[] = []): Proof => {
  const [, question, hookup] = laid(rig)
  return { question, hookup, seen, heard, several: false }
}

function codes(rig: Rig, ...proofs: readonly Proof[]): string[] {
  const [snapshot] = laid(rig)
  return checkProofs(snapshot, ABOUT, proofs).findings.flatMap((f) => f.map((x) => x.code))
}

describe('a test chain', () => {
  it('stands when all but what it tries is known to work', () => {
    const rig = untried()
    expect(codes(rig, trial(rig, [VIDEO]))).toEqual([])
  })

  it('stands whatever is said of the unit as a whole', () => {
    const rig = untried()
    unitIn(rig, 'player').working = 'faulty'
    expect(codes(rig, trial(rig, [VIDEO]))).toEqual([])
  })

  it('is refused when it leans on something else that is untried', () => {
    const rig = untried()
    expect(codes(rig, trial(rig, []))).toEqual(['untried-beside'])
    unitIn(rig, 'set').functions = []
    rig.hookup.axes.doubt = 2
    expect(codes(rig, trial(rig, [VIDEO]))).toEqual(['untried-beside'])
  })

  it('is refused when it does not try what it says, or what has been tried before', () => {
    const rig = untried()
    expect(codes(rig, trial(rig, [VIDEO, LEFT]))).toEqual(['not-on-trial'])
    expect(codes(rig, trial(rig, [VIDEO]), trial(rig, [VIDEO]))).toEqual(['not-on-trial'])
  })

  it('may count on what one before it has tried', () => {
    const rig = untried()
    const player = unitIn(rig, 'player')
    player.forms = player.forms.filter((f) => f.port !== 'sound-out-l')
    rig.hookup.axes.doubt = 2
    expect(codes(rig, trial(rig, [VIDEO], [LEFT]))).toEqual([])
    expect(codes(rig, trial(rig, [], [LEFT]))).toEqual(['untried-beside'])
    expect(codes(rig, trial(rig, [VIDEO], [LEFT]), trial(rig, []))).toEqual([])
  })

  it('is refused with leads of which too few are known to work', () => {
    const rig = untried()
    unitIn(rig, 'phonos').working = 'untested'
    expect(codes(rig, trial(rig, [VIDEO]))).toEqual(['lead-untried'])
  })

  it('is refused when it is to be heard and is silent', () => {
    const rig = untried()
    rig.hookup.sound.sound = 'none'
    expect(codes(rig, trial(rig, [VIDEO], [LEFT]))).toContain('nothing-heard')
  })
})
