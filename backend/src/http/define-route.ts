import type { IncomingHttpHeaders } from 'node:http';
import type { Request, Response } from 'express';
import type * as z from 'zod/mini';
import type { Action } from '#shared/access/may';
import type { Person } from '#shared/access/roles';
import type { DeviceId } from '#shared/plant/ids';

export type SubjectKind = 'company' | 'opening' | 'sequence' | 'package';

/** Who is asking, and how they proved it. */
export interface Caller {
  readonly person: Person;
  readonly personName: string;
  readonly via: 'session' | 'device';
  /** Set when the device credential came along and belongs to this person. */
  readonly deviceId: DeviceId | null;
  /** When the password was last given in this session; `null` by device credential. */
  readonly passwordGivenAt: Date | null;
}

/**
 * Whether a phone's 30-day device credential is enough, and when it is looked at: `first` on the paths that drain an
 * outbox (one look-up where a session needs two), `fallback` where a session may show more than a device.
 */
export type DeviceUse = 'first' | 'fallback';

/**
 * Who may call a route. There is no default: a route without a rule doesn't compile, and what no rule allows is refused.
 * `self` is for what concerns only the caller's own things; `param` names the path parameter that holds the subject.
 */
export type AccessRule =
  | { readonly kind: 'public'; readonly reason: string }
  | { readonly kind: 'self'; readonly reason: string; readonly device?: DeviceUse }
  | {
      readonly kind: 'action';
      readonly action: Action;
      readonly subject: SubjectKind;
      readonly param?: string;
      readonly device?: DeviceUse;
    };

export interface UploadRule {
  readonly field: string;
  readonly maxBytes: number;
}

export interface RouteInput<P, Q, B, C> {
  readonly params: P;
  readonly query: Q;
  readonly body: B;
  readonly caller: C;
  readonly file: { readonly bytes: Buffer; readonly name: string } | null;
  readonly headers: IncomingHttpHeaders;
  readonly requestId: string;
  /** For the few routes that stream, or that change the session itself. */
  readonly exchange: { readonly request: Request; readonly response: Response };
}

type Schema = z.ZodMiniType;
type Out<S> = S extends Schema ? z.output<S> : undefined;

export interface RouteDefinition<
  A extends AccessRule = AccessRule,
  P extends Schema | undefined = Schema | undefined,
  Q extends Schema | undefined = Schema | undefined,
  B extends Schema | undefined = Schema | undefined,
  R extends Schema | 'nothing' | 'stream' = Schema | 'nothing' | 'stream',
> {
  readonly method: 'get' | 'post' | 'put' | 'delete';
  readonly path: string;
  readonly summary: string;
  readonly access: A;
  readonly params?: P;
  readonly query?: Q;
  readonly body?: B;
  readonly upload?: UploadRule;
  /** `nothing`: 204. `stream`: the handler writes the response itself. */
  readonly response: R;
  readonly status?: number;
  handle(
    input: RouteInput<Out<P>, Out<Q>, Out<B>, A extends { kind: 'public' } ? null : Caller>,
  ): Promise<R extends Schema ? z.input<R> : void>;
}

/** A route of any shape, as the list of routes holds it. */
export type AnyRoute = Omit<RouteDefinition, 'handle'> & {
  handle(input: RouteInput<unknown, unknown, unknown, unknown>): Promise<unknown>;
};

/** Defines one endpoint. The handler gets what the schemas made of the request, and no more. */
export function defineRoute<
  const A extends AccessRule,
  P extends Schema | undefined,
  Q extends Schema | undefined,
  B extends Schema | undefined,
  const R extends Schema | 'nothing' | 'stream',
>(definition: RouteDefinition<A, P, Q, B, R>): AnyRoute {
  return definition as unknown as AnyRoute;
}
