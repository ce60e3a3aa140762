import { useMutation, useQueryClient, type QueryKey } from '@tanstack/react-query'

/**
 * A change whose answer is the changed record: it is put where the record is read from, and lists that show it are fetched
 * again. What else changed is told by the server's events.
 */
export function useChange<I, R extends { id: string }>(send: (input: I) => Promise<R>, keyOf: (id: string) => QueryKey, lists: readonly QueryKey[]) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: send,
    onSuccess: (record) => {
      client.setQueryData(keyOf(record.id), record)
      for (const queryKey of lists) void client.invalidateQueries({ queryKey })
    },
  })
}
