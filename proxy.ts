import { NextResponse, type NextRequest } from 'next/server'
import { contentPolicy } from '@/lib/http/content-policy.mjs'
import { frameOrigins } from '@/lib/services/frame-origins'

export const config = { matcher: '/embed/:token' }

/** A framed page names in its headers exactly the sites that its link may be shown on. Every other page names none. */
export async function proxy(request: NextRequest) {
  const token = request.nextUrl.pathname.split('/')[2] ?? ''
  const origins = await frameOrigins(token).catch(() => [])
  const response = NextResponse.next()
  response.headers.set('content-security-policy', contentPolicy(origins))
  return response
}
