/** Other tabs of this browser that have the same draft open: each tells the others of what it saved. */
export class Others {
  private channel: BroadcastChannel | null = null;

  constructor(private readonly id: string) {}

  /** Calls back when another tab has saved; returns how to stop. */
  listen(saved: () => void): () => void {
    if (typeof BroadcastChannel === 'undefined') return () => {};
    const channel = new BroadcastChannel(`matchmark:draft:${this.id}`);
    channel.onmessage = saved;
    this.channel = channel;
    return () => {
      channel.close();
      this.channel = null;
    };
  }

  tell = (version: number): void => this.channel?.postMessage(version);
}
