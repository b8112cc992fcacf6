import { Picture, type PictureRequest, paint } from '@shared/pattern';
import { type KnownDesign, KnownDesigns } from './known-designs';
import type { Answer, Failure, PicturePart, PictureTask, ProbeTask, Request } from './messages';
import { type Probe, probeAt } from './probe';
import { turnGrey } from './turn-grey';

/** What a host needs around it. */
export interface HostMeans {
  readonly post: (answer: Answer, transfer: ArrayBuffer[]) => void;
  /** Runs something soon, after messages that already wait. */
  readonly later: (run: () => void) => void;
}

/** Samples traced before others get their turn: well under ten milliseconds on either engine. */
const PORTION = 16_384;
const PORTION_OF_REFERENCE = 1_024;

interface Job {
  readonly requestId: number;
  readonly task: PictureTask;
  readonly known: KnownDesign;
  /** Null until it is its turn. */
  begun: { readonly picture: Picture; readonly portion: number } | null;
}

/** The pictures of a lane that a newer one may begin from. */
interface Kept {
  /** The one asked for last, however far it came: in another look it goes on. */
  readonly last: Picture;
  /** The last one that was finished: what is still right of it is taken over. */
  readonly finished: Picture | null;
}

/**
 * Makes pictures and answers questions about designs, one portion of work after the other, so that a newer request is
 * heard between two portions. Knows no thread: the worker runs it, and specs run it in-line.
 */
export class ComputeHost {
  private readonly designs = new KnownDesigns();
  private jobs: readonly Job[] = [];
  private readonly kept = new Map<string, Kept>();
  private isGoing = false;

  constructor(private readonly means: HostMeans) {}

  receive(request: Request): void {
    const { requestId } = request;
    try {
      switch (request.kind) {
        case 'design':
          this.designs.add(request.payload.key, request.payload.design);
          break;
        case 'forget':
          this.designs.remove(request.payload.key);
          break;
        case 'picture':
          this.take(requestId, request.payload);
          break;
        case 'probe':
          this.means.post({ requestId, kind: 'probe', payload: this.probe(request.payload) }, []);
          break;
        case 'stop':
          this.jobs = this.jobs.filter((job) => job.requestId !== requestId);
          break;
        case 'release':
          this.jobs = this.jobs.filter((job) => job.task.lane !== request.payload.lane);
          this.kept.delete(request.payload.lane);
          break;
      }
    } catch (error) {
      this.fail(requestId, { code: 'broken', message: String(error) });
    }
  }

  /** Takes a job on; what it costs to make ready waits for its turn. */
  private take(requestId: number, task: PictureTask): void {
    const known = this.designs.get(task.design);
    this.jobs = [
      ...this.jobs.filter((job) => job.task.lane !== task.lane),
      { requestId, task, known, begun: null },
    ];
    this.go();
  }

  private begin(job: Job): void {
    const { requestId, task, known } = job;
    const ready = this.designs.ready(known, task.at);
    if (ready === null) {
      this.drop(job);
      this.kept.delete(task.lane);
      this.fail(requestId, { code: 'no-state', message: '' });
      return;
    }
    const { program, steels, blank, tracer } = ready;
    const portion = tracer.engine === 'reference' ? PORTION_OF_REFERENCE : PORTION;
    const { surface, window, widthPx, heightPx, samples, isKept = false } = task;
    const asked: PictureRequest = { program, steels, surface, blank, window, widthPx, heightPx, samples };
    const kept = this.kept.get(task.lane);
    if (kept && isSameRequest(kept.last.request, asked)) {
      // Only the look is new: what was traced is shown in it at once, and goes on from there.
      job.begun = { picture: kept.last, portion };
      if (kept.last.stage !== 'blocks') this.show(job, kept.last);
      return;
    }
    const finished = kept?.finished ?? null;
    const picture = new Picture(asked, tracer, finished, isKept);
    // A picture that was stopped is let go of, and with it the one that it began from.
    if (isKept) this.kept.set(task.lane, { last: picture, finished });
    job.begun = { picture, portion };
  }

  private go(): void {
    if (this.isGoing || this.jobs.length === 0) return;
    this.isGoing = true;
    this.means.later(() => {
      this.isGoing = false;
      this.work();
      this.go();
    });
  }

  /** One portion of the job whose turn it is: the lowest rank, and of those the oldest. */
  private work(): void {
    const [first, ...others] = this.jobs;
    if (!first) return;
    const job = others.reduce((best, other) => (other.task.rank < best.task.rank ? other : best), first);
    try {
      if (job.begun === null) {
        this.begin(job);
        return;
      }
      const { picture, portion } = job.begun;
      const before = picture.stage;
      if (picture.advance(portion) !== before) this.show(job, picture);
    } catch (error) {
      this.drop(job);
      this.fail(job.requestId, { code: 'broken', message: String(error) });
    }
  }

  private show(job: Job, picture: Picture): void {
    const { requestId, task } = job;
    const { stage, counters } = picture;
    if (stage === 'done') {
      this.drop(job);
      if (task.isKept) this.kept.set(task.lane, { last: picture, finished: picture });
    }
    const { program, steels } = picture.request;
    const { rgba } = paint(picture.samples, program, steels, task.look, picture.pixelMm);
    const pixels = rgba as PicturePart['pixels'];
    if (task.isGrey) turnGrey(pixels);
    const { widthPx, heightPx } = task;
    const payload: PicturePart = { stage, widthPx, heightPx, pixels, counters };
    this.means.post({ requestId, kind: 'picture', payload }, [pixels.buffer]);
  }

  private drop(job: Job): void {
    this.jobs = this.jobs.filter((other) => other !== job);
  }

  private probe({ design, at, surface, across, up }: ProbeTask): Probe | null {
    const ready = this.designs.ready(this.designs.get(design), at);
    if (ready === null) return null;
    return probeAt(this.designs.exactTracer(ready), surface, ready.blank, across, up);
  }

  private fail(requestId: number, payload: Failure): void {
    this.means.post({ requestId, kind: 'failed', payload }, []);
  }
}

/** Whether two pictures show the same samples: of the very same program, from the same place. */
function isSameRequest(a: PictureRequest, b: PictureRequest): boolean {
  return (
    a.program === b.program &&
    a.widthPx === b.widthPx &&
    a.heightPx === b.heightPx &&
    a.samples === b.samples &&
    JSON.stringify([a.surface, a.window]) === JSON.stringify([b.surface, b.window])
  );
}
