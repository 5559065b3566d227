import { useQuery } from '@tanstack/react-query';
import type { PredictionBody, PredictionResponse } from '@slighthill/shared/contracts/prediction';
import { useDebounced } from '../../../lib/use-debounced';
import { predictionQuery } from '../queries';

export interface Preview {
  data: PredictionResponse | null;
  /** The numbers belong to what was typed a moment ago; newer ones are on their way. */
  updating: boolean;
  failed: boolean;
}

/** Asks for predictions a moment after the last key; what is shown is the answer to the newest request. */
export const usePreview = (request: PredictionBody | null): Preview => {
  const text = JSON.stringify(request);
  const settled = useDebounced(text, 400);
  const query = useQuery(predictionQuery(JSON.parse(settled) as PredictionBody | null));
  const nothing = request === null;
  return {
    data: nothing ? null : (query.data ?? null),
    updating: !nothing && (settled !== text || query.isPlaceholderData || query.isLoading),
    failed: !nothing && query.isError,
  };
};
