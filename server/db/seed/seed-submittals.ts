import { type Disposition, findingKey } from '#rules/engine/finding';
import type { NoteKind } from '#shared/contracts/notes';
import { dateOfInstant } from '#shared/format/dates';
import { isWorkingDay } from '#shared/working-days';
import { demoWorkbooks } from '#tests/workbooks/demo/write-demo-workbooks';
import type { Deps } from '../../deps';
import { newestCheckOf } from '../queries/checks';
import { demoId } from './demo-id';
import { demoOrganisations } from './demo-people';
import { demoProjects } from './seed-projects';
import { type DemoDesk, type DemoPlace, demoDesk } from './submittals-desk';

/**
 * One submittal for each state worth looking at, made by the acts of the product itself, some working days before
 * the day of seeding: the clocks of the queue then run as they would.
 */
export async function seedSubmittals(deps: Deps): Promise<void> {
  const day = workingDaysBefore(deps.now());
  const lettingOn = demoProjects[0]?.lettingOn ?? day(60).slice(0, 10);
  const workbooks = await demoWorkbooks({ submittedOn: day(24).slice(0, 10), lettingOn });
  let made = 0;
  const newId = () => {
    made += 1;
    return demoId(`submittals/${made}`);
  };
  const desk = demoDesk({
    deps: { ...deps, newId },
    workbook: (name) => {
      const found = workbooks.find((each) => each.name === name);
      if (!found) throw new Error(`The demo has no workbook ${name}.`);
      return found.bytes;
    },
  });
  await approved(desk, day);
  await returnedWithDraft(desk, day);
  await inReview(desk, day);
  await underWay(desk, day);
  await notTaken(desk, day);
  await inDoubt(desk, new Date(deps.now().getTime() - 40 * 60_000).toISOString());
}

type Day = (before: number, time?: string) => string;

async function approved(desk: DemoDesk, day: Day): Promise<void> {
  const place = await desk.upload(day(24), {
    by: 'Leda Farrow',
    project: 'CV-2034',
    mixDesignation: 'KD-095-L1',
    workbook: 'KD-095-L1 r0.xlsx',
  });
  await desk.submit(day(24, '14:20'), { by: 'Leda Farrow', place });
  await review(desk, day, {
    place,
    by: 'Patience Adeyinka',
    taken: 22,
    answer: {
      sent: 18,
      disposition: 'approved',
      reason: 'The design meets the section; what is noted calls for nothing.',
    },
  });
}

async function returnedWithDraft(desk: DemoDesk, day: Day): Promise<void> {
  const place = await desk.upload(day(14), {
    by: 'Bram Ostler',
    project: 'CV-2034',
    mixDesignation: 'TA-190-B2',
    workbook: 'TA-190-B2 r0.xlsx',
  });
  await desk.submit(day(14, '11:05'), { by: 'Bram Ostler', place });
  await review(desk, day, {
    place,
    by: 'Ines Tordoff',
    taken: 13,
    notes: [
      {
        at: day(8, '09:40'),
        kind: 'to be returned',
        text: 'The mix is dry and dusty. More binder and a cleaner sand would mend most of what is listed.',
      },
    ],
    answer: {
      sent: 7,
      disposition: 'revise and resubmit',
      reason: 'Volumetrics and resistance to moisture are to be put right before production.',
    },
  });
  await desk.revise(day(0, '07:30'), { by: 'Nia Corrie', place, workbook: 'TA-190-B2 r1.xlsx' });
}

async function inReview(desk: DemoDesk, day: Day): Promise<void> {
  const first = await desk.upload(day(20), {
    by: 'Sorcha Lund',
    project: 'CV-2031',
    mixDesignation: 'BW-125-S4',
    workbook: 'BW-125-S4 r0.xlsx',
  });
  await desk.submit(day(20, '15:10'), { by: 'Dele Fairweather', place: first });
  await review(desk, day, {
    place: first,
    by: 'Ines Tordoff',
    taken: 19,
    notes: [
      {
        at: day(12, '09:10'),
        finding: 'dust-proportion~design point',
        kind: 'to be returned',
        text: 'Your sheet divides by total binder. The ratio is to effective binder. Please correct it and bring the dust down.',
      },
    ],
    answer: {
      sent: 11,
      disposition: 'revise and resubmit',
      reason: 'The mix is close; the dust proportion is to be put right.',
    },
  });
  const second = await desk.revise(day(3), {
    by: 'Sorcha Lund',
    place: first,
    workbook: 'BW-125-S4 r1.xlsx',
  });
  await desk.submit(day(3, '16:00'), { by: 'Dele Fairweather', place: second });
  await review(desk, day, {
    place: second,
    by: 'Ines Tordoff',
    taken: 2,
    notes: [
      {
        at: day(1, '10:15'),
        finding: 'dust-proportion~design point',
        kind: 'internal',
        text: 'Revision 0 failed on dust. Ask whether the baghouse return was in the blend.',
      },
      {
        at: day(1, '10:20'),
        kind: 'to be returned',
        text: 'Thank you for correcting the dust proportion.',
      },
    ],
  });
}

/** A mix with much to put right, half way through its review. */
async function underWay(desk: DemoDesk, day: Day): Promise<void> {
  const place = await desk.upload(day(5), {
    by: 'Nia Corrie',
    project: 'CV-2022',
    mixDesignation: 'TA-190-B2',
    workbook: 'TA-190-B2 r0.xlsx',
  });
  await desk.submit(day(5, '12:15'), { by: 'Bram Ostler', place });
  const [required, advisory] = await Promise.all([
    firstFail(desk, place, 'required'),
    firstFail(desk, place, 'advisory'),
  ]);
  await review(desk, day, {
    place,
    by: 'Ines Tordoff',
    taken: 4,
    notes: [
      {
        at: day(1, '14:05'),
        finding: required,
        kind: 'to be returned',
        text: 'Please show with the next revision how this is met at the plant, not only in the laboratory.',
      },
      {
        at: day(1, '14:10'),
        kind: 'internal',
        text: 'The same mix came back on CV-2034. Decide both alike.',
      },
    ],
  });
  await desk.waive(day(1, '14:20'), {
    by: 'Ines Tordoff',
    place,
    finding: advisory,
    reason: 'Within what the last three productions of this plant have shown to perform.',
  });
}

/** Which findings fail is for the check to say, and a demo without one would be no demo. */
async function firstFail(desk: DemoDesk, place: DemoPlace, wanted: 'required' | 'advisory'): Promise<string> {
  const agency = { kind: 'agency', organisationId: demoOrganisations.agency.id } as const;
  const check = await newestCheckOf(desk.db, agency, place.revisionId);
  const fail = check?.result.findings.find(
    ({ outcome, severity, kind }) => outcome === 'fail' && severity === wanted && kind !== 'consistency',
  );
  if (fail === undefined) throw new Error(`The demo's revision has no ${wanted} finding that fails.`);
  return findingKey(fail);
}

interface Review {
  place: DemoPlace;
  /** The reviewer. */
  by: string;
  /** Taken so many working days before the day of seeding. */
  taken: number;
  notes?: { at: string; finding?: string; kind: NoteKind; text: string }[];
  /** Without one the review is still under way. */
  answer?: { sent: number; disposition: Disposition; reason: string };
}

/** What the agency does with a revision: a reviewer takes it and writes on it, the signing engineer answers. */
async function review(
  desk: DemoDesk,
  day: Day,
  { place, by, taken, notes = [], answer }: Review,
): Promise<void> {
  await desk.take(day(taken), { by, place });
  for (const { at, finding = null, ...note } of notes) {
    await desk.note(at, { by, place, finding, ...note });
  }
  if (answer === undefined) return;
  const { sent, ...decision } = answer;
  await desk.sendReturn(day(sent), { by: 'Mairi Halloran', place, ...decision });
}

async function notTaken(desk: DemoDesk, day: Day): Promise<void> {
  const place = await desk.upload(day(1), {
    by: 'Tove Hallam',
    project: 'CV-2031',
    mixDesignation: 'KD-095-L1',
    workbook: 'KD-095-L1 r0.xlsx',
  });
  await desk.submit(day(1, '13:45'), { by: 'Leda Farrow', place });
}

async function inDoubt(desk: DemoDesk, at: string): Promise<void> {
  await desk.upload(at, {
    by: 'Sorcha Lund',
    project: 'CV-2034',
    mixDesignation: 'BW-125-S6',
    workbook: 'BW-125-S6 r0.xlsx',
  });
}

/** An instant on the n-th working day before now; never later than now. */
function workingDaysBefore(now: Date): Day {
  const today = dateOfInstant(now.toISOString(), 'UTC');
  return (before, time = '08:30') => {
    let date = today;
    for (let left = before; left > 0; ) {
      date = new Date(Date.parse(`${date}T00:00:00Z`) - 86_400_000).toISOString().slice(0, 10);
      if (isWorkingDay(date)) left -= 1;
    }
    const instant = new Date(`${date}T${time}:00.000Z`);
    return (instant > now ? now : instant).toISOString();
  };
}
