package io.github.polewright.tone;

/** What the tracker tells. Instants are in hops, with a fraction; index is the hop at which it was decided. */
interface PairSink {

    void began(PairSums symbol, double start, long index);

    void ended(PairSums symbol, double start, double end, long index);
}
