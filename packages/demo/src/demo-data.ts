import type { Market, Model } from '@coaxwain/models'
import type { OffAir, Uid, Unit } from '@coaxwain/shelf'

/** Short name of a person, a place or a collection within the demo data; never shown. */
export type DemoKey = string

export const DEMO_ROLES = ['owner', 'collector', 'restorer', 'reseller', 'viewer'] as const
/** What a person may do inside one collection. */
export type DemoRole = (typeof DEMO_ROLES)[number]

export const SITE_ROLES = ['catalogue-editor', 'administrator'] as const
/** A right over the whole site; it gives none inside a collection. */
export type SiteRole = (typeof SITE_ROLES)[number]

/** A person who can sign in. Pass phrases are made when the data is loaded, and are not kept here. */
export interface DemoPerson {
  readonly uid: Uid
  readonly key: DemoKey
  readonly name: string
  readonly email: string
  readonly locale: 'en-GB' | 'en-US'
  readonly site: SiteRole | null
}

export interface DemoMembership {
  /** Key of a person. */
  readonly person: DemoKey
  readonly role: DemoRole
}

/** A room, a shelf, a box. Parents come before the places inside them. */
export interface DemoPlace {
  readonly uid: Uid
  readonly key: DemoKey
  readonly name: string
  /** Key of the place that it stands in, or null at the top. */
  readonly parent: DemoKey | null
}

/**
 * A unit as the shelf knows it, with `place` the key of a place of the same collection, and `by` of every
 * state the key of a person. Dates are plain dates of 2026.
 */
export interface DemoUnit extends Unit {
  /** Running number within its collection: unique, and never given again. */
  readonly number: number
  /** What its people call it, or nothing. */
  readonly label: string
  readonly serial: string
  readonly note: string
  readonly addedOn: string
}

export interface DemoCollection {
  readonly uid: Uid
  readonly key: DemoKey
  readonly name: string
  readonly market: Market
  /** ISO 4217. */
  readonly currency: string
  /** Stations received where the collection stands. */
  readonly offAir: readonly OffAir[]
  readonly members: readonly DemoMembership[]
  readonly places: readonly DemoPlace[]
  /** Devices first, then the leads drawer; every `model` is a uid of the shared catalogue. */
  readonly units: readonly DemoUnit[]
}

/**
 * Everything that a first start loads. References: units to models by uid, units to places and states to
 * people by key, memberships to people by key. Nothing depends on a clock or on chance.
 */
export interface DemoData {
  /** The shared catalogue. */
  readonly models: Readonly<Record<Uid, Model>>
  readonly people: readonly DemoPerson[]
  readonly collections: readonly DemoCollection[]
}
