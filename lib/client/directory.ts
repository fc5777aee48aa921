import type { z } from 'zod'
import type { ContactInput, StageInput, SupplierInput, VenueInput } from '@/lib/contracts/directory'
import { contactSchema, stageSchema, supplierSchema, venueSchema } from '@/lib/contracts/directory'
import type { PlayerInput } from '@/lib/contracts/player'
import { playerSchema } from '@/lib/contracts/player'
import { callApi } from './http'

function resource<Schema extends z.ZodType, Input>(path: string, key: string, response: Schema) {
  return {
    create: (under: string, id: string, input: Input) =>
      callApi(under, { method: 'POST', body: { id, [key]: input }, response }),
    change: (id: string, version: number, input: Input) =>
      callApi(`${path}/${id}`, { method: 'PATCH', body: { version, [key]: input }, response }),
    remove: (id: string, version: number) =>
      callApi(`${path}/${id}`, { method: 'DELETE', body: { version }, response }),
  }
}

/** The directory's rows over HTTP: made under a place, changed and taken away by the version that was seen. */
export const venues = resource<typeof venueSchema, VenueInput>('/api/venues', 'venue', venueSchema)
export const stages = resource<typeof stageSchema, StageInput>('/api/stages', 'stage', stageSchema)
export const suppliers = resource<typeof supplierSchema, SupplierInput>('/api/suppliers', 'supplier', supplierSchema)
export const contacts = resource<typeof contactSchema, ContactInput>('/api/contacts', 'contact', contactSchema)
export const players = resource<typeof playerSchema, PlayerInput>('/api/players', 'player', playerSchema)
