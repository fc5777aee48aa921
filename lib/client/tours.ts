import type { DayInput, NewDaysInput, NewTourInput, RigInput, ShowInput, TourInput } from '@/lib/contracts/tour'
import { daySchema, madeDaysSchema, rigSchema, showSchema, tourSchema } from '@/lib/contracts/tour'
import { callApi } from './http'

export const createTour = (id: string, tour: NewTourInput) =>
  callApi('/api/tours', { method: 'POST', body: { id, tour }, response: tourSchema })
export const changeTour = (id: string, version: number, tour: TourInput) =>
  callApi(`/api/tours/${id}`, { method: 'PATCH', body: { version, tour }, response: tourSchema })

export const createRig = (tourId: string, id: string, rig: RigInput) =>
  callApi(`/api/tours/${tourId}/rigs`, { method: 'POST', body: { id, rig }, response: rigSchema })
export const changeRig = (id: string, version: number, rig: RigInput) =>
  callApi(`/api/rigs/${id}`, { method: 'PATCH', body: { version, rig }, response: rigSchema })

export const createDays = (tourId: string, days: NewDaysInput) =>
  callApi(`/api/tours/${tourId}/days`, { method: 'POST', body: { days }, response: madeDaysSchema })
export const changeDay = (id: string, version: number, day: DayInput) =>
  callApi(`/api/days/${id}`, { method: 'PATCH', body: { version, day }, response: daySchema })
export const removeDay = (id: string, version: number) =>
  callApi(`/api/days/${id}`, { method: 'DELETE', body: { version }, response: daySchema })

export const createShow = (tourId: string, id: string, show: ShowInput) =>
  callApi(`/api/tours/${tourId}/shows`, { method: 'POST', body: { id, show }, response: showSchema })
export const changeShow = (id: string, version: number, show: ShowInput) =>
  callApi(`/api/shows/${id}`, { method: 'PATCH', body: { version, show }, response: showSchema })
export const removeShow = (id: string, version: number) =>
  callApi(`/api/shows/${id}`, { method: 'DELETE', body: { version }, response: showSchema })
