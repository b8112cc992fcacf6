import { HttpClient, type HttpResponse } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import type { Design } from '@shared/design';
import { catchError, map, type Observable, of } from 'rxjs';
import { ProblemError } from '../http/problem-error';

/** What a list shows of a design without opening it. */
export interface DesignSummary {
  readonly layers: number | null;
  readonly bars: number;
  readonly startMassKg: number | null;
  readonly endMassKg: number | null;
}

export interface DesignListItem {
  readonly id: string;
  readonly name: string;
  readonly revision: number;
  /** UTC, ISO 8601. */
  readonly updatedAt: string;
  readonly summary: DesignSummary;
}

/** A design as the server keeps it. */
export interface StoredDesign {
  readonly id: string;
  readonly revision: number;
  /** Names this very revision; a save carries it. */
  readonly etag: string;
  readonly updatedAt: string;
  readonly document: Design;
}

/** What the server answers for one design, beside the ETag. */
interface DesignBody {
  readonly id: string;
  readonly revision: number;
  readonly updatedAt: string;
  readonly document: Design;
}

/** How a save went. Only `saved` means that it is kept. */
export type SaveResult =
  | { readonly kind: 'saved'; readonly design: StoredDesign }
  /** Someone saved in between; fetch the design to see what it is now. */
  | { readonly kind: 'conflict'; readonly problem: ProblemError }
  | { readonly kind: 'offline' }
  /** The session is over. */
  | { readonly kind: 'signed-out' }
  /** Deleted, or no longer this account's. */
  | { readonly kind: 'gone' }
  | { readonly kind: 'refused'; readonly problem: ProblemError };

/** The account's designs over HTTP. Everything but `save` fails with a {@link ProblemError}. */
@Injectable({ providedIn: 'root' })
export class DesignsApi {
  private readonly http = inject(HttpClient);

  list(): Observable<readonly DesignListItem[]> {
    return this.http.get<readonly DesignListItem[]>('/api/designs');
  }

  get(id: string): Observable<StoredDesign> {
    return this.http.get<DesignBody>(pathOf(id), { observe: 'response' }).pipe(map(storedOf));
  }

  create(document: Design): Observable<StoredDesign> {
    return this.http
      .post<DesignBody>('/api/designs', { document }, { observe: 'response' })
      .pipe(map(storedOf));
  }

  /** Saves over the revision that `etag` names, and over no other. Never fails: the result says how it went. */
  save(id: string, document: Design, etag: string): Observable<SaveResult> {
    return this.http
      .put<DesignBody>(pathOf(id), { document }, { observe: 'response', headers: { 'If-Match': etag } })
      .pipe(
        map((response): SaveResult => ({ kind: 'saved', design: storedOf(response) })),
        catchError((error: unknown) => of(failureOf(error))),
      );
  }

  /** Takes it off the bench; `restore` brings it back. */
  delete(id: string, etag: string): Observable<void> {
    return this.http.delete<void>(pathOf(id), { headers: { 'If-Match': etag } });
  }

  restore(id: string): Observable<StoredDesign> {
    return this.http
      .post<DesignBody>(`${pathOf(id)}/restore`, {}, { observe: 'response' })
      .pipe(map(storedOf));
  }
}

function pathOf(id: string): string {
  return `/api/designs/${encodeURIComponent(id)}`;
}

function storedOf(response: HttpResponse<DesignBody>): StoredDesign {
  const body = response.body;
  const etag = response.headers.get('ETag');
  if (body === null || etag === null)
    throw new Error('The server answered a design without its body or ETag');
  return { id: body.id, revision: body.revision, etag, updatedAt: body.updatedAt, document: body.document };
}

function failureOf(error: unknown): SaveResult {
  if (!(error instanceof ProblemError)) throw error;
  if (error.isOffline) return { kind: 'offline' };
  if (error.status === 412) return { kind: 'conflict', problem: error };
  if (error.status === 401) return { kind: 'signed-out' };
  if (error.status === 404) return { kind: 'gone' };
  return { kind: 'refused', problem: error };
}
