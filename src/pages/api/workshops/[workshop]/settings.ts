import { changeSettings } from '../../../../features/workshops/server/change-settings.ts';
import { ChangeSettingsInput, MadeWorkshop, workshopParam } from '../../../../features/workshops/workshop.ts';
import { paths } from '../../../../paths.ts';
import { apiRoute } from '../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeSettings,
  params: workshopParam,
  body: ChangeSettingsInput,
  answer: MadeWorkshop,
  form: {
    page: ({ workshop }) => paths.workshopSettings(workshop),
    done: ({ slug }) => paths.workshopSettings(slug),
  },
});
