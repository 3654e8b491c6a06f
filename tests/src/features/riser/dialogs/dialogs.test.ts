import { flushPromises, type VueWrapper } from '@vue/test-utils'
import { afterEach, describe, expect, it } from 'vitest'
import { cableTypeFixtures } from '../../../../../fixtures/catalog/cableTypes.ts'
import { deviceModelFixtures } from '../../../../../fixtures/catalog/deviceModels.ts'
import type { Catalog } from '../../../../../shared/api/catalog.ts'
import type { Item } from '../../../../../shared/commands/items.ts'
import { find, recordsOf } from '../../../../../shared/model/jobDocument.ts'
import { useSelectionStore } from '../../../../../src/features/job/selectionStore.ts'
import RiserDialogs from '../../../../../src/features/riser/dialogs/RiserDialogs.vue'
import { cordChoices } from '../../../../../src/features/riser/inspector/cordChoices.ts'
import { useRiserStore, type DialogKind } from '../../../../../src/features/riser/riserStore.ts'
import { codeFrom, nextLevel, nextRoomX } from '../../../../../src/features/riser/tools/nextNames.ts'
import { buildDevice, buildDoc, buildLevel, buildModel, buildPlate, smallHouse } from '../../../../support/build.ts'
import { mountOnRiser, openJob } from '../../../../support/riserMount.ts'

const catalog: Catalog = {
  cableTypes: cableTypeFixtures.map((description) => ({ id: `cat-${description.code.replace(/[^A-Za-z0-9]/g, '-')}`, version: 1, description })),
  deviceModels: Object.entries(deviceModelFixtures).map(([key, description]) => ({ id: `mod-${key}`, version: 1, description })),
}
let shown: VueWrapper | undefined
afterEach(() => {
  shown?.unmount()
  document.body.innerHTML = ''
})

async function ask(dialog: DialogKind, doc = buildDoc(...smallHouse()), chosen: readonly Item[] = []) {
  const job = await openJob(doc)
  useSelectionStore().choose(...chosen)
  useRiserStore().dialog = dialog
  shown = mountOnRiser(RiserDialogs, { catalog })
  await flushPromises()
  const sheet = document.querySelector<HTMLElement>('.sheet')!
  const box = (label: string) => [...sheet.querySelectorAll('label.field')].find((each) => each.querySelector('span')!.textContent === label)!.querySelector<HTMLInputElement>('input, select')!
  const fill = async (label: string, text: string) => {
    const input = box(label)
    input.value = text
    input.dispatchEvent(new Event(input.tagName === 'SELECT' ? 'change' : 'input'))
    input.dispatchEvent(new Event('blur'))
    await flushPromises()
  }
  const submit = async () => {
    sheet.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }))
    await flushPromises()
  }
  return { job, sheet, box, fill, submit, isOpen: () => useRiserStore().dialog !== null }
}

describe('the forms of the riser', () => {
  it('offer the next level over the highest', async () => {
    const { job, box, submit, isOpen } = await ask('level')
    expect(box('Name').value).toBe('Level 2')
    await submit()
    expect(recordsOf(job.doc, 'level').at(-1)).toMatchObject({ name: 'Level 2', code: 'L2', elevationMm: 3099 })
    expect(isOpen()).toBe(false)
  })

  it('add one room after the other, each with a code of its own, each east of the last', async () => {
    const { job, fill, submit, isOpen } = await ask('room')
    for (const name of ['Great room', 'Green room']) {
      await fill('Name', name)
      await submit()
    }
    const [first, second] = recordsOf(job.doc, 'room').slice(-2)
    expect([first!.code, second!.code]).toEqual(['GRE', 'GRE2'])
    expect(Math.min(...second!.outline.map((point) => point.xMm))).toBe(Math.max(...first!.outline.map((point) => point.xMm)))
    expect(isOpen()).toBe(true)
  })

  it('stay open and say why where the job refuses', async () => {
    const { job, fill, submit, sheet, isOpen } = await ask('room')
    await fill('Name', 'Other patio')
    await fill('Code, in labels', 'PAT')
    await submit()
    expect(isOpen()).toBe(true)
    expect(sheet.textContent).toContain('Code PAT is taken by Patio')
    expect(job.outbox).toHaveLength(0)
  })

  it('lay a run from the first free port to the first free jack', async () => {
    const { job, submit } = await ask('run', buildDoc(...smallHouse(), buildPlate({ id: 'pat2', number: 2, jacks: [{ id: 'k1', position: 1, connector: 'speaker-pair' }] })))
    await submit()
    expect(recordsOf(job.doc, 'run').at(-1)).toMatchObject({ a: { deviceId: 'sp1', terminal: 'p2' }, b: { plateId: 'pat2', jackId: 'k1' }, label: 'PAT2-S1' })
    expect(job.outbox).toHaveLength(1)
  })

  it('put a plate with its runs into a room', async () => {
    const { job, fill, submit } = await ask('plate')
    await fill('Plate', 'wallSpeaker')
    await submit()
    expect(job.outbox).toHaveLength(1)
    expect(recordsOf(job.doc, 'run').at(-1)!.label).toBe('PAT2-S1')
  })

  it('say what goes along before anything goes', async () => {
    const { job, sheet, submit } = await ask('remove', undefined, [{ kind: 'room', id: 'pat' }])
    expect(sheet.textContent).toContain('Delete 1 room?')
    expect(sheet.textContent).toContain('1 plate, 1 run')
    await submit()
    expect(find(job.doc, 'room', 'pat')).toBeUndefined()
    job.undo()
    expect(find(job.doc, 'run', 'r1')?.label).toBe('PAT1-S1')
  })

  it('offer to drop what is worked on, with a reason', async () => {
    const print = { kind: 'labelPrint' as const, id: 'lp', at: '2026-05-19T12:00:00.000Z', byId: 'me', runId: 'r1', end: 'a' as const, text: 'PAT1-S1', copies: 1, stock: 'x' }
    const { job, sheet } = await ask('remove', buildDoc(...smallHouse(), print), [{ kind: 'run', id: 'r1' }])
    expect(sheet.textContent).toContain('printed or worked on')
    ;[...sheet.querySelectorAll('button')].find((button) => button.textContent === 'Drop, with a reason')!.click()
    await flushPromises()
    const drop = document.querySelectorAll<HTMLElement>('.sheet')
    const reason = drop[drop.length - 1]!.querySelector<HTMLInputElement>('input')!
    reason.value = 'Not wanted'
    reason.dispatchEvent(new Event('input'))
    await flushPromises()
    reason.closest('form')!.dispatchEvent(new Event('submit', { cancelable: true }))
    expect(find(job.doc, 'run', 'r1')!.dropped).toBe('Not wanted')
  })
})

describe('names to begin with', () => {
  it('are free', () => {
    expect(codeFrom('Église', new Set())).toBe('EGL')
    expect(codeFrom('***', new Set(['X']))).toBe('X2')
    expect(nextLevel(buildDoc()).elevationMm).toBe(0)
    expect(nextLevel(buildDoc(buildLevel({ name: 'Level 2', code: 'L2' }))).code).toBe('L3')
    expect(nextRoomX(buildDoc(...smallHouse()), 'l1')).toBe(13_000)
  })
})

describe('what takes a cord', () => {
  it('is free, fits, and what is nearest comes first', () => {
    const doc = buildDoc(...smallHouse(), buildModel({ id: 'm-amp', category: 'amplifier', name: 'Amp' }), buildDevice({ id: 'amp', modelId: 'm-amp', code: 'AMP', unit: 10 }))
    const choices = cordChoices(doc, 'amp', 'speaker-pair')
    expect(choices[0]).toMatchObject({ group: 'In the same rack', code: 'SP1-01' })
    expect(choices.at(-1)).toMatchObject({ group: 'Plates', code: 'PAT1 jack 1' })
    expect(cordChoices(doc, 'amp', 'coax')).toEqual([])
  })
})
