import { SignedParts, SignPartsInput, fileParams } from '../../../../../../../../features/files/file.ts';
import { signParts } from '../../../../../../../../features/files/server/sign-parts.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: signParts,
  params: fileParams,
  body: SignPartsInput,
  answer: SignedParts,
});
