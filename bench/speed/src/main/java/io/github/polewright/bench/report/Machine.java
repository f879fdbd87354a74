package io.github.polewright.bench.report;

import com.sun.management.HotSpotDiagnosticMXBean;
import java.io.IOException;
import java.lang.management.GarbageCollectorMXBean;
import java.lang.management.ManagementFactory;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.jspecify.annotations.Nullable;

/**
 * Where numbers were taken; numbers without it mean nothing.
 *
 * @param jvm name, version and vendor
 * @param flags the JVM was started with
 * @param processor name and how many of them the JVM may use
 * @param system operating system
 * @param governor of the processor's frequency
 * @param fusedMultiplyAdd yes, no or unknown
 * @param collector garbage collector
 */
public record Machine(
        String jvm,
        String flags,
        String processor,
        String system,
        String governor,
        String fusedMultiplyAdd,
        String collector) {

    private static final String UNREADABLE = "not readable";

    /**
     * This machine and this JVM.
     *
     * @return what could be read
     */
    public static Machine here() {
        List<String> flags = ManagementFactory.getRuntimeMXBean().getInputArguments();
        return new Machine(
                property("java.vm.name") + " " + property("java.runtime.version") + " (" + property("java.vm.vendor")
                        + ")",
                flags.isEmpty() ? "none" : String.join(" ", flags),
                processorHere() + ", " + Runtime.getRuntime().availableProcessors() + " usable",
                property("os.name") + " " + property("os.version") + " " + property("os.arch"),
                firstLine(Path.of("/sys/devices/system/cpu/cpu0/cpufreq/scaling_governor")),
                fusedMultiplyAddHere(),
                ManagementFactory.getGarbageCollectorMXBeans().stream()
                        .map(GarbageCollectorMXBean::getName)
                        .collect(Collectors.joining(" + ")));
    }

    private static String property(String name) {
        return System.getProperty(name, "unknown");
    }

    private static String processorHere() {
        try {
            return Files.readAllLines(Path.of("/proc/cpuinfo")).stream()
                    .filter(line -> line.startsWith("model name"))
                    .map(line -> line.substring(line.indexOf(':') + 1).strip())
                    .findFirst()
                    .orElse(property("os.arch"));
        } catch (IOException noSuchFile) {
            String identifier = System.getenv("PROCESSOR_IDENTIFIER");
            return identifier == null ? property("os.arch") : identifier;
        }
    }

    private static String firstLine(Path file) {
        try {
            List<String> lines = Files.readAllLines(file);
            return lines.isEmpty() ? UNREADABLE : lines.get(0).strip();
        } catch (IOException noSuchFile) {
            return UNREADABLE;
        }
    }

    private static String fusedMultiplyAddHere() {
        @Nullable HotSpotDiagnosticMXBean bean = ManagementFactory.getPlatformMXBean(HotSpotDiagnosticMXBean.class);
        if (bean == null) {
            return "unknown";
        }
        try {
            return bean.getVMOption("UseFMA").getValue().equals("true") ? "yes" : "no";
        } catch (IllegalArgumentException noSuchOption) {
            return "unknown";
        }
    }

    /**
     * The header of every report.
     *
     * @return a line a fact
     */
    public List<String> header() {
        return List.of(
                line("JVM", jvm),
                line("flags", flags),
                line("processor", processor),
                line("system", system),
                line("governor", governor),
                line("FMA", fusedMultiplyAdd),
                line("collector", collector));
    }

    private static String line(String name, String value) {
        return String.format(Locale.ROOT, "%-10s %s", name, value);
    }
}
