import { takeLinkPassword } from '@/lib/http/take-link-password'

export async function POST(request: Request, { params }: RouteContext<'/embed/[token]/pass'>) {
  return takeLinkPassword(request, '/embed', (await params).token)
}
