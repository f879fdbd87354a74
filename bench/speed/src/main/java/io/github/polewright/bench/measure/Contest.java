package io.github.polewright.bench.measure;

import io.github.polewright.bench.workload.Rig;
import java.time.Duration;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Rigs timed in turn in one JVM, A B C A B C and so on, so that a clock that wanders slows all of them alike and ratios
 * hold where times do not.
 */
public final class Contest {

    private static final Duration TURN = Duration.ofMillis(1);

    private final Duration warmUp;
    private final int rounds;
    private final List<Player> players = new ArrayList<>();

    /** A rig and how many blocks it plays a turn. */
    private static final class Player {
        final String name;
        final Rig rig;
        final double[] turns;
        int blocks = 1;

        Player(String name, Rig rig, int rounds) {
            this.name = name;
            this.rig = rig;
            this.turns = new double[rounds];
        }

        double turn() {
            long start = System.nanoTime();
            for (int i = 0; i < blocks; i++) {
                rig.block();
            }
            return (double) (System.nanoTime() - start) / blocks / rig.chain().work();
        }
    }

    /**
     * A contest without players.
     *
     * @param warmUp each player plays this long before anything counts
     * @param rounds turns of each that count
     */
    public Contest(Duration warmUp, int rounds) {
        this.warmUp = warmUp;
        this.rounds = rounds;
    }

    /**
     * Adds a player.
     *
     * @param name the key of its score
     * @param rig what it plays; its own, since a player keeps its states
     * @return this
     */
    public Contest add(String name, Rig rig) {
        players.add(new Player(name, rig, rounds));
        return this;
    }

    /**
     * Plays all rounds.
     *
     * @return nanoseconds per sample per section, by name
     */
    public Map<String, Score> play() {
        players.forEach(this::warm);
        for (int round = 0; round < rounds; round++) {
            for (Player player : players) {
                player.turns[round] = player.turn();
            }
        }
        Map<String, Score> scores = new LinkedHashMap<>();
        players.forEach(player -> scores.put(player.name, new Score(player.turns)));
        return scores;
    }

    /** Warms up, finds how many blocks make a turn, and leaves the rig freshly excited. */
    private void warm(Player player) {
        player.rig.excite();
        long end = System.nanoTime() + warmUp.toNanos();
        double blockNanos = Double.POSITIVE_INFINITY;
        do {
            blockNanos = Math.min(blockNanos, player.turn() * player.rig.chain().work());
            player.blocks = (int) Math.max(1, Math.min(100_000, TURN.toNanos() / Math.max(blockNanos, 1)));
        } while (System.nanoTime() < end);
        player.rig.excite();
    }
}
