/** The least that a route handler can do: read JSON, answer JSON. */
export async function POST(request: Request): Promise<Response> {
  return Response.json({ data: await request.json() });
}
