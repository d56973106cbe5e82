import { TEMPLATES } from '../templates';

/** A file template as a download; it belongs to no team and needs no session. */
export async function GET(
  _request: Request,
  { params }: RouteContext<'/help/templates/[fileName]'>,
) {
  const { fileName } = await params;
  const template = TEMPLATES.find((one) => one.fileName === fileName);
  if (template === undefined) return new Response('There is no such template.\n', { status: 404 });
  return new Response(template.text, {
    headers: {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': `attachment; filename="${template.fileName}"`,
      'x-content-type-options': 'nosniff',
    },
  });
}
