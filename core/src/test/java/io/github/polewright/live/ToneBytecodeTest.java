package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.tone.CadenceReader;
import io.github.polewright.tone.PairReader;
import io.github.polewright.tone.ToneMeter;
import java.io.IOException;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

/**
 * What feeding and draining the readers of tones can reach, read from the class files: nothing is created, locked or
 * thrown but by the checks of arguments. Kept beside the walk it takes.
 */
final class ToneBytecodeTest {

    private static final String ROOM = "io/github/polewright/tone/";

    private static final Set<String> ALLOWED = Set.of(
            "java/lang/Double.doubleToRawLongBits",
            "java/lang/Double.longBitsToDouble",
            "java/lang/Math.abs",
            "java/lang/Math.atan2",
            "java/lang/Math.log10",
            "java/lang/Math.max",
            "java/lang/Math.min",
            "java/lang/Math.round",
            "java/lang/Math.sqrt",
            "java/lang/String.charAt",
            "java/util/Arrays.fill",
            "java/util/concurrent/atomic/AtomicLong.getAcquire",
            "java/util/concurrent/atomic/AtomicLong.getPlain",
            "java/util/concurrent/atomic/AtomicLong.setRelease",
            "java/util/concurrent/atomic/AtomicLongArray.getAcquire",
            "java/util/concurrent/atomic/AtomicLongArray.setRelease");

    /** Where arguments are checked, and refusals made. */
    private static final List<String> CHECKS = List.of("io/github/polewright/slab/Ranges.", ROOM + "Intake.planar ");

    /** Where a call goes through an interface or a lambda, the walk begins anew at what takes it. */
    private static List<BytecodeWalk> walks() throws IOException {
        List<BytecodeWalk> walks = new ArrayList<>();
        for (Class<?> type : List.of(PairReader.class, ToneMeter.class, CadenceReader.class)) {
            walks.add(BytecodeWalk.from(type, "process", "poll", "reset", "hop", "levelDbfs"));
        }
        walks.add(BytecodeWalk.from(type("PairReader$Windows"), "take", "guard"));
        walks.add(BytecodeWalk.from(type("PairReader$Records"), "began", "ended"));
        walks.add(BytecodeWalk.from(type("ToneBank"), "take", "guard"));
        return walks;
    }

    private static Class<?> type(String name) {
        try {
            return Class.forName("io.github.polewright.tone." + name);
        } catch (ClassNotFoundException e) {
            throw new AssertionError(e);
        }
    }

    @Test
    void feedingAndDrainingCreateLockAndThrowNothing() throws IOException {
        Set<String> offences = new TreeSet<>();
        for (BytecodeWalk walk : walks()) {
            for (Map.Entry<String, MethodFacts> entry : walk.reached().entrySet()) {
                if (CHECKS.stream().noneMatch(entry.getKey()::startsWith)) {
                    add(offences, entry.getKey(), entry.getValue());
                }
            }
        }
        assertEquals(Set.of(), offences);
    }

    private static void add(Set<String> offences, String method, MethodFacts facts) {
        if (facts.locks || facts.throwsItself) {
            offences.add(method + " locks or throws");
        }
        facts.created.forEach(type -> offences.add(method + " creates " + type));
        facts.dynamic.forEach(bootstrap -> offences.add(method + " calls by " + bootstrap));
        for (String call : facts.calls) {
            String name = call.substring(0, call.indexOf(' '));
            if (!name.startsWith("io/github/polewright/") && !ALLOWED.contains(name)) {
                offences.add(method + " calls " + name);
            }
        }
    }

    /** Control: every interface that a walk ends at is one whose implementation another walk begins at. */
    @Test
    void theWalksReachTheRecursionsTheTrackersAndTheRing() throws IOException {
        Set<String> reached = new TreeSet<>();
        Set<String> open = new TreeSet<>();
        for (BytecodeWalk walk : walks()) {
            reached.addAll(walk.reached().keySet());
            walk.unresolved().forEach(method -> open.add(method.substring(0, method.indexOf(' '))));
        }
        assertEquals(
                Set.of(
                        ROOM + "InnerSamples.guard",
                        ROOM + "InnerSamples.take",
                        ROOM + "PairSink.began",
                        ROOM + "PairSink.ended",
                        ROOM + "ToneBank$Hops.hop"),
                open);
        for (String part : List.of(
                "PairSpectrum.advance",
                "PairTracker.qualify",
                "ToneBank.resonate",
                "ToneTracker.hop",
                "CadenceTracker.hop",
                "FrontEnd.section",
                "RecordRing.publish")) {
            assertTrue(reached.stream().anyMatch(method -> method.startsWith(ROOM + part)), part + " not reached");
        }
    }
}
