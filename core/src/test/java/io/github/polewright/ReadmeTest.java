package io.github.polewright;

import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.File;
import java.io.IOException;
import java.lang.invoke.MethodHandle;
import java.lang.invoke.MethodHandles;
import java.lang.invoke.MethodType;
import java.net.URL;
import java.net.URLClassLoader;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import javax.tools.JavaCompiler;
import javax.tools.StandardJavaFileManager;
import javax.tools.ToolProvider;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** The embedding example of the readme, compiled from its very lines and run. */
class ReadmeTest {

    private static final Path README = Path.of("..", "README.md");
    private static final int BLOCK = 64;
    private static final String IMPORTS = """
            import io.github.polewright.*;
            import io.github.polewright.design.*;
            import io.github.polewright.live.*;
            """;

    @TempDir
    private Path folder;

    @Test
    void exampleHasTenLinesOfCode() throws IOException {
        long lines = example()
                .lines()
                .filter(line -> !line.isBlank() && !line.strip().equals("}"))
                .count();
        assertTrue(lines <= 10, "the example has " + lines + " lines of code");
    }

    @Test
    void exampleRemovesHumAndFollowsARetune() throws Throwable {
        compile();
        try (URLClassLoader loader =
                new URLClassLoader(new URL[] {folder.toUri().toURL()})) {
            Class<?> type = loader.loadClass("HumFreeInput");
            MethodHandles.Lookup lookup = MethodHandles.privateLookupIn(type, MethodHandles.lookup());
            Object input = lookup.findConstructor(type, MethodType.methodType(void.class))
                    .invoke();
            MethodHandle process = lookup.findVirtual(
                    type, "audioThread", MethodType.methodType(void.class, float[].class, int.class));
            MethodHandle retune =
                    lookup.findVirtual(type, "anyThread", MethodType.methodType(void.class, double.class));
            assertTrue(leftOf(50, input, process) < 1e-4, "50 Hz and DC are left");
            assertTrue(leftOf(60, input, process) > 0.5, "60 Hz is gone before anything was said of it");
            retune.invoke(input, 60.0);
            assertTrue(leftOf(60, input, process) < 1e-4, "60 Hz is left after the retune");
        }
    }

    /** The peak that is left of full-scale hum and some DC in the last of 20 s. */
    private static double leftOf(double humHz, Object input, MethodHandle process) throws Throwable {
        float[] block = new float[2 * BLOCK];
        double peak = 0;
        for (int start = 0; start < 20 * 48_000; start += BLOCK) {
            for (int i = 0; i < block.length; i++) {
                block[i] = (float) (0.1 + 0.9 * Math.sin(2 * Math.PI * humHz * (start + i / 2) / 48_000));
            }
            process.invoke(input, block, BLOCK);
            if (start >= 19 * 48_000) {
                for (float sample : block) {
                    peak = Math.max(peak, Math.abs(sample));
                }
            }
        }
        return peak;
    }

    private void compile() throws IOException {
        Path source = Files.writeString(folder.resolve("HumFreeInput.java"), IMPORTS + example());
        JavaCompiler compiler = ToolProvider.getSystemJavaCompiler();
        try (StandardJavaFileManager files = compiler.getStandardFileManager(null, null, null)) {
            List<String> options =
                    List.of("-d", folder.toString(), "-proc:none", "-cp", System.getProperty("java.class.path", "."));
            boolean compiled = compiler.getTask(
                            null, files, null, options, null, files.getJavaFileObjects(new File(source.toString())))
                    .call();
            assertTrue(compiled, "the example does not compile");
        }
    }

    private static String example() throws IOException {
        Matcher blocks = Pattern.compile("```java\n(final class HumFreeInput .*?)```", Pattern.DOTALL)
                .matcher(Files.readString(README));
        assertTrue(blocks.find(), "README.md has no class HumFreeInput");
        return blocks.group(1);
    }
}
