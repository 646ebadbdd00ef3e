import { Done, SecondStepInput } from '../../../features/accounts/account.ts';
import { verifySecondStep } from '../../../features/accounts/server/verify-second-step.ts';
import { ownPath, paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: verifySecondStep,
  params: NONE,
  body: SecondStepInput,
  answer: Done,
  limit: [{ name: 'second-step', by: 'address', tries: 60, seconds: 600 }],
  form: {
    page: (_params, values) => paths.secondStep(values['next']),
    done: (_result, input) => ownPath(input.next),
    secrets: ['code'],
  },
});
