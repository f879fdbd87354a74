package io.github.polewright.live;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import io.github.polewright.slab.Ranges;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import org.junit.jupiter.api.Test;

/**
 * What the audio thread can reach from {@code process} and {@code reset}, read from the class files: it creates
 * nothing, locks nothing, throws nothing and calls nothing outside but the methods listed here. The checks of arguments
 * may create and throw an exception, and nothing else.
 */
class BytecodeTest {

    private static final String[] AUDIO_THREAD = {"process", "reset"};

    /** The JVM compiles no method beyond this (HotSpot's HugeMethodLimit). */
    private static final int MOST_BYTES = 8_000;

    /** Bounded in time, and neither locking, allocating nor blocking. */
    private static final Set<String> ALLOWED = Set.of(
            "java/lang/Double.doubleToRawLongBits",
            "java/lang/Math.abs",
            "java/lang/Math.ceil",
            "java/lang/Math.fma",
            "java/lang/Math.max",
            "java/lang/Math.min",
            "java/lang/Math.sqrt",
            "java/lang/System.arraycopy",
            "java/nio/FloatBuffer.get",
            "java/nio/FloatBuffer.put",
            "java/nio/FloatBuffer.position",
            "java/nio/FloatBuffer.isDirect",
            "java/nio/FloatBuffer.isReadOnly",
            "java/nio/FloatBuffer.order",
            "java/nio/FloatBuffer.remaining",
            "java/nio/ByteOrder.nativeOrder",
            "java/util/Arrays.equals",
            "java/util/Arrays.fill",
            // Throws where an argument is missing, and else does nothing.
            "java/util/Objects.requireNonNull",
            "java/util/concurrent/atomic/AtomicLong.setRelease",
            "java/util/concurrent/atomic/AtomicReference.getAcquire",
            "java/util/concurrent/atomic/AtomicReference.setRelease");

    /** What a refusal may call besides, for its message. */
    private static final String TEXT = "java/lang/String.valueOf";

    private static final Set<String> REFUSALS = Set.of(
            "java/lang/IllegalArgumentException",
            "java/lang/IndexOutOfBoundsException",
            "java/lang/NullPointerException");

    @Test
    void theAudioThreadCreatesLocksAndThrowsNothing() throws IOException {
        assertEquals(Set.of(), offences(BytecodeWalk.from(LiveCascade.class, AUDIO_THREAD)));
    }

    @Test
    void noReachableMethodIsTooLargeToCompile() throws IOException {
        BytecodeWalk.from(LiveCascade.class, AUDIO_THREAD)
                .reached()
                .forEach((method, facts) ->
                        assertTrue(facts.mostBytes <= MOST_BYTES, facts.mostBytes + " bytes in " + method));
    }

    /** Control: the walk arrives at the loops and at the conversions, so it did not stop on the way. */
    @Test
    void theWalkReachesTheLoops() throws IOException {
        BytecodeWalk walk = BytecodeWalk.from(LiveCascade.class, AUDIO_THREAD);
        assertEquals(List.of(), walk.unresolved());
        for (String part : List.of("live/RawDirectForm1.", "live/RawTransposed.", "live/RawGlide.", "slab/Slab.load")) {
            assertTrue(
                    walk.reached().keySet().stream().anyMatch(method -> method.contains(part)),
                    part + " not reached, only " + walk.reached().keySet());
        }
        assertTrue(
                walk.reached().values().stream().anyMatch(facts -> facts.calls.contains("java/lang/Math.fma (DDD)D")));
    }

    /** Control: every kind of offence is seen. */
    @Test
    void plantedOffencesAreSeen() throws IOException {
        Set<String> seen = offences(BytecodeWalk.from(Planted.class, "process"));
        for (String offence : List.of("java/lang/Object", "array of", "StringConcat", "locks", "throws", "nanoTime")) {
            assertTrue(seen.stream().anyMatch(line -> line.contains(offence)), offence + " not in " + seen);
        }
    }

    private static Set<String> offences(BytecodeWalk walk) {
        Set<String> offences = new TreeSet<>();
        String checks = Ranges.class.getName().replace('.', '/') + ".";
        for (Map.Entry<String, MethodFacts> entry : walk.reached().entrySet()) {
            String method = entry.getKey();
            MethodFacts facts = entry.getValue();
            boolean check = method.startsWith(checks);
            if (facts.locks) {
                offences.add(method + " locks");
            }
            if (facts.throwsItself && !check) {
                offences.add(method + " throws");
            }
            for (String type : facts.created) {
                if (!(check && REFUSALS.contains(type))) {
                    offences.add(method + " creates " + type);
                }
            }
            for (String bootstrap : facts.dynamic) {
                if (!(check && bootstrap.startsWith("java/lang/invoke/StringConcatFactory."))) {
                    offences.add(method + " calls by " + bootstrap);
                }
            }
            for (String call : facts.calls) {
                if (!allowed(call, check)) {
                    offences.add(method + " calls " + call);
                }
            }
        }
        return offences;
    }

    private static boolean allowed(String call, boolean check) {
        String name = call.substring(0, call.indexOf(' '));
        return name.startsWith("io/github/polewright/")
                || ALLOWED.contains(name)
                || check
                        && (name.equals(TEXT)
                                || name.endsWith(".<init>") && REFUSALS.contains(name.replace(".<init>", "")));
    }

    /** Everything that is forbidden, in one place. */
    static final class Planted {

        private final Object lock = new Object();

        Object process(int[] values) {
            synchronized (lock) {
                return values.length == 0 ? new Object() : deeper(values.length);
            }
        }

        private static Object deeper(int count) {
            if (count < 0) {
                throw new IllegalStateException("count is " + count);
            }
            return System.nanoTime() > 0 ? new double[count] : new Object[count];
        }
    }
}
