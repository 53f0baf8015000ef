// Does something again until it succeeds: a person, too, presses a key again that the window did not take.

/** Runs `act` (told the number of the attempt, from 0) up to `times` times. @throws what its last attempt threw. */
export async function persist<T>(times: number, act: (attempt: number) => Promise<T>): Promise<T> {
  for (let attempt = 0; ; attempt++) {
    try {
      return await act(attempt);
    } catch (error) {
      if (attempt + 1 >= times) throw error;
    }
  }
}
