import { z } from 'zod';
import { lineOfText, runningText } from '../../domain/plain-text.ts';
import { buildParams, buildVersion } from './build.ts';

export const STAGE_NAME_LENGTH = 80;
export const STAGE_ABOUT_LENGTH = 2000;
/** A build of more stages than this would want to be several builds. */
export const MOST_STAGES = 60;

export const stageParams = buildParams.extend({ stage: z.uuid('That is not an id of ours.') });

export const AddStageInput = z.object({
  name: lineOfText('Enter a name.', STAGE_NAME_LENGTH),
  about: runningText(STAGE_ABOUT_LENGTH),
});
export type AddStage = z.output<typeof AddStageInput>;

export const ChangeStageInput = AddStageInput.extend({ version: buildVersion });
export type ChangeStage = z.output<typeof ChangeStageInput>;

export const MoveStageInput = z.object({
  to: z.enum(['up', 'down'], 'Choose up or down.'),
  version: buildVersion,
});
export type MoveStage = z.output<typeof MoveStageInput>;

/** Where the diary entries of a deleted stage go: to another stage, or `none`. Asked only when there are any. */
export const DeleteStageInput = z.object({
  version: buildVersion,
  entries: z.union([z.literal('none'), z.uuid(), z.literal('').transform(() => undefined)]).optional(),
});
export type DeleteStage = z.output<typeof DeleteStageInput>;

export const RestoreStageInput = z.object({ version: buildVersion });

/** A stage as pages know it. */
export interface Stage {
  readonly id: string;
  readonly name: string;
  readonly about: string;
  readonly version: number;
  /** How many diary entries are on it. */
  readonly entries: number;
}

export const SavedRow = z.object({ id: z.uuid(), version: z.number() });
