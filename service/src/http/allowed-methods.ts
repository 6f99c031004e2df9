import type { Request } from 'express';

interface RouteLayer {
  route?: { methods: Record<string, boolean> };
  match(path: string): boolean;
}

/** Methods that some route would take at this path; empty when the path itself is unknown. */
export function allowedMethods(request: Request): string[] {
  const { stack } = (request.app as unknown as { router: { stack: RouteLayer[] } }).router;
  const methods = new Set<string>();
  for (const layer of stack) {
    if (!layer.route || !layer.match(request.path)) continue;
    for (const method of Object.keys(layer.route.methods)) methods.add(method.toUpperCase());
  }
  if (methods.has('GET')) methods.add('HEAD');
  return [...methods].sort();
}
