import { apiAnswers } from '~/services/answers.server';
import { describeApi } from '~/services/openapi.server';

export const loader = apiAnswers(async () => describeApi());
