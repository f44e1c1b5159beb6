import { useMutation } from '@tanstack/react-query';
import {
  municipalitySchema,
  type SetUpMunicipalityInput,
} from '../../../../shared/contracts/base-data.ts';
import { callApi } from '../../../lib/api-client.ts';

/** Says, once, which place the server serves; the whole client starts anew with it. */
export function useSetUpMunicipality() {
  return useMutation({
    mutationFn: (input: SetUpMunicipalityInput) =>
      callApi(municipalitySchema, '/municipality', { method: 'PUT', body: input }),
    onSuccess: () => window.location.assign('/'),
  });
}
