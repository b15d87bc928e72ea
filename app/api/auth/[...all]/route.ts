import { auth } from '@/lib/server/auth'

const handler = (request: Request): Promise<Response> => auth().handler(request)

export { handler as GET, handler as POST }
