/** Who is asking. */
export interface Actor {
  userId: string;
}
