import { takeLinkPassword } from '@/lib/http/take-link-password'

export async function POST(request: Request, { params }: RouteContext<'/s/[token]/pass'>) {
  return takeLinkPassword(request, '/s', (await params).token)
}
