package io.github.polewright.mains;

/** Decides whether the followed lines are mains hum: nothing is removed before. Derived for this project. */
final class Proof {

    private static final double SLOW_PROOF_SECONDS = 10;
    private static final double QUICK_SECONDS = 0.08;
    private static final double FAIL_SECONDS = 1.5;
    private static final double STEADY_FACTOR = 1.6;
    private static final double NOTE_CENTS = 10;
    private static final double EXACT_NOTE_CENTS = 4;
    private static final double NEAR_NOTE_SECONDS = 2;
    private static final double SETTLE_SECONDS = 1;
    private static final double MOVED_HZ = 0.04;
    private static final double MEMORY_SECONDS = 60;
    private static final double RECENT_TRIAL_SECONDS = 0.4;
    private static final double STRIKE = 1.5;
    private static final double STRIKE_FADE = 0.1;
    /** Jumps closer than this are one. */
    private static final double JUMP_SECONDS = 0.3;

    private static final double MOST_STRIKES = 2.5;
    private static final double GONE_SHARE = 0.7;
    private static final double GONE_SECONDS = 0.5;
    private static final double USUAL_SECONDS = 5;
    private static final double DROPPED_SHARE = 0.4;
    private static final double LOWEST_HZ = 44.5;
    private static final double HIGHEST_HZ = 65.5;

    private final Presence presence;
    private MainsState state = MainsState.SEARCHING;
    private double trialSeconds;
    private double proofSeconds;
    private double failSeconds;
    private double goneSeconds;
    private double steadyPower;
    private double usualPower;
    private double lowestHz;
    private double highestHz;
    private double strikes;
    private double sinceProof = MEMORY_SECONDS;
    private double sinceJump;
    private boolean jumping;
    private boolean jumped;
    private boolean matched;
    private boolean dropped;

    Proof(Presence presence) {
        this.presence = presence;
    }

    void reset() {
        state = MainsState.SEARCHING;
        sinceProof = MEMORY_SECONDS;
        sinceJump = 0;
        jumping = false;
    }

    MainsState state() {
        return state;
    }

    /** Whether lines may be removed. */
    boolean holds() {
        return state == MainsState.FOLLOWING || state == MainsState.HOLDING;
    }

    void begin(double frequencyHz) {
        state = MainsState.PROVING;
        trialSeconds = 0;
        proofSeconds = 0;
        failSeconds = 0;
        goneSeconds = 0;
        steadyPower = 0;
        usualPower = 0;
        strikes = 0;
        jumped = false;
        matched = false;
        dropped = false;
        lowestHz = frequencyHz;
        highestHz = frequencyHz;
    }

    /** The first second held the lines as they are now. */
    void match(boolean matches) {
        matched = matches;
    }

    /** Whether lines are followed that have lost most of their power lately: another mains may have taken over. */
    boolean hasDropped() {
        return holds() && dropped;
    }

    /** A trial that has not had its quick proof can be replaced. */
    boolean isSlow() {
        return state == MainsState.PROVING && trialSeconds > 1;
    }

    void searchSeconds(double seconds) {
        sinceProof = Math.min(MEMORY_SECONDS, sinceProof + seconds);
    }

    /** A tick of silence: a trial fails in it, what is proven is kept. */
    void silence(double seconds) {
        sinceProof = Math.min(MEMORY_SECONDS, sinceProof + seconds);
        if (state == MainsState.PROVING || sinceProof >= MEMORY_SECONDS) {
            state = MainsState.SEARCHING;
        } else {
            state = MainsState.HOLDING;
        }
    }

    void tick(double seconds, double frequencyHz, boolean jump) {
        if (!(frequencyHz >= LOWEST_HZ && frequencyHz <= HIGHEST_HZ)) {
            state = MainsState.SEARCHING;
        } else if (state == MainsState.PROVING) {
            proving(seconds, frequencyHz, jump);
        } else {
            following(seconds, jump, frequencyHz);
        }
    }

    private void proving(double seconds, double frequencyHz, boolean jump) {
        searchSeconds(seconds);
        trialSeconds += seconds;
        boolean settling = trialSeconds < SETTLE_SECONDS;
        lowestHz = settling ? frequencyHz : Math.min(lowestHz, frequencyHz);
        highestHz = settling ? frequencyHz : Math.max(highestHz, frequencyHz);
        int lines = presence.clearLines();
        failSeconds = lines >= 1 ? 0 : failSeconds + seconds;
        if (failSeconds > FAIL_SECONDS) {
            state = MainsState.SEARCHING;
            return;
        }
        double power = presence.clearPower();
        boolean steady = power < steadyPower * STEADY_FACTOR && power * STEADY_FACTOR > steadyPower;
        jumped |= jump;
        if (lines < 2 || jump || !steady) {
            proofSeconds = 0;
            steadyPower = power;
        }
        proofSeconds += seconds;
        if (proofSeconds >= SLOW_PROOF_SECONDS || (lines >= 3 && quick(frequencyHz))) {
            state = MainsState.FOLLOWING;
            sinceProof = 0;
        }
    }

    private boolean quick(double frequencyHz) {
        double cents = TemperedNotes.centsAway(frequencyHz);
        boolean moved = highestHz - lowestHz > MOVED_HZ || cents > EXACT_NOTE_CENTS;
        boolean noNote = cents > NOTE_CENTS || (moved && proofSeconds > NEAR_NOTE_SECONDS);
        if (jumped || !noNote || trialSeconds < QUICK_SECONDS) {
            return false;
        }
        return matched || (sinceProof < MEMORY_SECONDS && trialSeconds > RECENT_TRIAL_SECONDS);
    }

    private void following(double seconds, boolean jump, double frequencyHz) {
        sinceProof = 0;
        double power = presence.clearPower();
        usualPower = Math.max(power, usualPower - usualPower * seconds / USUAL_SECONDS);
        dropped = power < DROPPED_SHARE * usualPower;
        sinceJump = jump ? 0 : sinceJump + seconds;
        boolean strike = jump && !jumping;
        jumping = sinceJump < JUMP_SECONDS;
        strikes = Math.max(0, strikes - STRIKE_FADE * seconds) + (strike ? STRIKE : 0);
        goneSeconds = presence.goneShare() >= GONE_SHARE ? goneSeconds + seconds : 0;
        if (goneSeconds >= GONE_SECONDS) {
            state = MainsState.SEARCHING;
        } else if (strikes > MOST_STRIKES) {
            begin(frequencyHz);
            jumped = true;
            sinceProof = MEMORY_SECONDS;
        } else {
            state = presence.anyOpen() ? MainsState.FOLLOWING : MainsState.HOLDING;
        }
    }
}
