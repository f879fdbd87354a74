package io.github.polewright.mains;

/** How far the search for the mains has come. */
public enum MainsState {
    /** No frequency is known. */
    SEARCHING,
    /** A frequency is tried; it may belong to the programme, so nothing is removed for it. */
    PROVING,
    /** The mains are followed. */
    FOLLOWING,
    /** The mains were followed; now programme or silence hides every line and the last frequency is kept. */
    HOLDING
}
