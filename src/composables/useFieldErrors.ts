import { toValue, type MaybeRefOrGetter } from 'vue'
import type { ApiError } from '@/api/request'
import { useWords } from './useWords'

/** What is wrong with one field of a form, in words; null where nothing is. */
export function useFieldErrors(problem: MaybeRefOrGetter<ApiError | null>) {
  const { t } = useWords()
  return (path: string): string | null => {
    const field = toValue(problem)?.fields.find((refused) => refused.path === path)
    return field ? t('states.allowed', { allowed: field.allowed }) : null
  }
}
