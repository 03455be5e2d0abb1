import { addOwner } from '@coaxwain/api/add-owner'
import { createPasswords } from '@coaxwain/api/passwords'
import { createPeopleRepository } from '@coaxwain/api/people'
import { together } from '@coaxwain/api/transact'
import { expect, test } from 'vitest'
import { Client } from '../support/client'
import { checksum } from '../support/database'
import { useRig } from '../support/rig'
import { emailOf } from '../support/world'

const rig = useRig()

const wish = {
  email: 'First.Owner@example.org',
  name: 'First Owner',
  collection: 'Top shelf',
  passPhrase: 'plover kettle rowan zinc',
}

test('the first owner of a server can sign in and has a collection', async () => {
  expect(
    await addOwner(together(rig.db, createPeopleRepository), await createPasswords(), wish),
  ).toBeNull()
  const answer = await new Client(rig.api.address).post('/session', {
    email: wish.email,
    password: wish.passPhrase,
  })
  expect(answer.body['memberships']).toMatchObject([
    { role: 'owner', collection: { name: 'Top shelf' } },
  ])
})

test.each([
  ['common', { passPhrase: 'passwordpassword1' }],
  ['too-short', { passPhrase: 'short' }],
  ['personal', { passPhrase: 'top shelf top shelf 7' }],
  ['email-malformed', { email: 'nobody' }],
  ['email-taken', { email: emailOf('viewer') }],
])('is refused as %s, and nothing is kept', async (fault, change) => {
  const before = await checksum(rig.db)
  const passwords = await createPasswords()
  expect(
    await addOwner(together(rig.db, createPeopleRepository), passwords, { ...wish, ...change }),
  ).toBe(fault)
  expect(await checksum(rig.db)).toBe(before)
})
