'use client'

import useSWR from 'swr'
import { addressOf, readAddress, Refusal } from '@/lib/contracts/call'
import type { Review } from '@/lib/contracts/verdicts'

export const reviewPath = '/api/v1/scenes/{id}/versions/{number}/review'

export interface OfVersion {
  sceneId: string
  version: number
}

export const paramsOf = ({ sceneId, version }: OfVersion) => ({ id: sceneId, number: version })

/** Where a review stands; every piece of the page that shows some of it reads the same answer. */
export function useReview(of: OfVersion) {
  const { data, error, mutate } = useSWR<{ review: Review }, Error>(
    addressOf(reviewPath, paramsOf(of)),
    readAddress,
  )
  return {
    review: data?.review ?? null,
    error,
    /** What the server answered to an act is what stands now. */
    put: (answer: { review: Review }) => void mutate(answer, { revalidate: false }),
  }
}

/** Words of a refusal, or the error thrown on. */
export function refusalWords(error: unknown): string {
  if (error instanceof Refusal) return `${error.problem.detail} ${error.problem.cure}`
  throw error
}

const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short' })
const dayAndTime = new Intl.DateTimeFormat('en-GB', {
  ...{ day: 'numeric', month: 'short', hour: '2-digit', minute: '2-digit', timeZoneName: 'short' },
})

/** A day without an hour: read as it is written, in whatever zone. */
export const dayWords = (date: string) => {
  const [year, month, number] = date.split('-').map(Number)
  return day.format(new Date(year, month - 1, number))
}
export const timeWords = (time: string) => dayAndTime.format(new Date(time))
export const dayOfTime = (time: string) => day.format(new Date(time))

export const heldWords = (review: Review, act: string): string | null | undefined =>
  review.offers.find((offer) => offer.act === act)?.held
