package io.github.polewright.mains;

import java.lang.invoke.MethodHandles;
import java.lang.invoke.VarHandle;

/**
 * Hands readings from the audio thread to any other. The writer counts to odd, writes, and counts to even: it never
 * waits. A reader takes its copy again while the count is odd or has moved; a write takes less than a microsecond and
 * comes once a mains period.
 */
final class ReadingSlot {

    private static final VarHandle COUNT;
    private static final VarHandle VALUES = MethodHandles.arrayElementVarHandle(double[].class);

    static {
        try {
            COUNT = MethodHandles.lookup().findVarHandle(ReadingSlot.class, "count", long.class);
        } catch (ReflectiveOperationException e) {
            throw new ExceptionInInitializerError(e);
        }
    }

    private static final int HEAD = 3;

    private final Tracker tracker;
    private final LinePhasors phasors;
    private final double[] values;

    @SuppressWarnings("UnusedVariable") // by its handle alone
    private long count;

    ReadingSlot(Tracker tracker, LinePhasors phasors) {
        this.tracker = tracker;
        this.phasors = phasors;
        values = new double[HEAD + tracker.bank.size()];
        publish();
    }

    /** Audio thread. */
    void publish() {
        long before = (long) COUNT.getOpaque(this);
        COUNT.setOpaque(this, before + 1);
        VarHandle.storeStoreFence();
        MainsState state = tracker.proof.state();
        boolean known = state != MainsState.SEARCHING;
        put(0, code(state));
        put(1, known ? tracker.loop.frequencyHz() : Double.NaN);
        put(2, known ? tracker.loop.uncertaintyHz() : Double.NaN);
        for (int i = 0; i < tracker.bank.size(); i++) {
            boolean there = known && tracker.presence.held[i];
            double scale = phasors.inputOverAnalysis(i % tracker.bank.lines);
            put(HEAD + i, there ? scale * Math.sqrt(tracker.bank.power(i)) : 0);
        }
        COUNT.setRelease(this, before + 2);
    }

    private static double code(MainsState state) {
        return switch (state) {
            case SEARCHING -> 0;
            case PROVING -> 1;
            case FOLLOWING -> 2;
            case HOLDING -> 3;
        };
    }

    private static MainsState state(double code) {
        if (code < 1) {
            return MainsState.SEARCHING;
        }
        if (code < 2) {
            return MainsState.PROVING;
        }
        return code < 3 ? MainsState.FOLLOWING : MainsState.HOLDING;
    }

    private void put(int i, double value) {
        VALUES.setOpaque(values, i, value);
    }

    /** Any thread. */
    MainsReading read() {
        double[] copy = new double[values.length];
        while (true) {
            long before = (long) COUNT.getAcquire(this);
            for (int i = 0; i < copy.length; i++) {
                copy[i] = (double) VALUES.getOpaque(values, i);
            }
            VarHandle.loadLoadFence();
            if ((before & 1) == 0 && before == (long) COUNT.getOpaque(this)) {
                break;
            }
            Thread.onSpinWait();
        }
        double[] levels = new double[copy.length - HEAD];
        System.arraycopy(copy, HEAD, levels, 0, levels.length);
        return new MainsReading(state(copy[0]), copy[1], copy[2], tracker.bank.lines, levels);
    }
}
