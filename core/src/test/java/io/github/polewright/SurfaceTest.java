package io.github.polewright;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.lang.module.ModuleDescriptor;
import java.lang.reflect.Modifier;
import java.net.URISyntaxException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Objects;
import java.util.SortedSet;
import java.util.TreeSet;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/**
 * What users can name: the public types of the exported packages, against the golden list {@code surface.txt}. A type
 * that is meant to be public is added there, one full name a line; anything else should not be public.
 */
class SurfaceTest {

    @Test
    void publicTypesAreTheListedOnes() throws IOException, URISyntaxException, ClassNotFoundException {
        SortedSet<String> listed = listed();
        SortedSet<String> found = found();
        assertEquals(List.of(), without(found, listed), "public, but not in surface.txt");
        assertEquals(List.of(), without(listed, found), "in surface.txt, but not public or not exported");
    }

    @Test
    void nothingIsRequiredAtRunTime() throws IOException, URISyntaxException {
        for (ModuleDescriptor.Requires requires : descriptor().requires()) {
            boolean free = requires.name().equals("java.base")
                    || requires.modifiers().contains(ModuleDescriptor.Requires.Modifier.STATIC);
            assertTrue(free, "requires " + requires);
        }
    }

    private static SortedSet<String> listed() throws IOException {
        try (InputStream list = Objects.requireNonNull(SurfaceTest.class.getResourceAsStream("surface.txt"))) {
            SortedSet<String> names = new TreeSet<>();
            for (String line : new String(list.readAllBytes(), StandardCharsets.UTF_8).split("\\R")) {
                if (!line.isBlank() && !line.startsWith("#")) {
                    names.add(line.strip());
                }
            }
            return names;
        }
    }

    private static SortedSet<String> found() throws IOException, URISyntaxException, ClassNotFoundException {
        SortedSet<String> names = new TreeSet<>();
        for (ModuleDescriptor.Exports exports : descriptor().exports()) {
            assertTrue(!exports.isQualified(), exports + " is exported to some only");
            try (Stream<Path> files = Files.list(root().resolve(exports.source().replace('.', '/')))) {
                for (Path file : (Iterable<Path>) files::iterator) {
                    String name = file.getFileName().toString();
                    if (name.endsWith(".class") && isPublic(exports.source(), name)) {
                        names.add(exports.source() + "."
                                + name.replace(".class", "").replace('$', '.'));
                    }
                }
            }
        }
        return names;
    }

    private static boolean isPublic(String packageName, String file) throws ClassNotFoundException {
        String name = packageName + "." + file.replace(".class", "");
        for (Class<?> type = Class.forName(name, false, SurfaceTest.class.getClassLoader());
                type != null;
                type = type.getDeclaringClass()) {
            if (!Modifier.isPublic(type.getModifiers()) || type.isAnonymousClass() || type.isLocalClass()) {
                return false;
            }
        }
        return true;
    }

    private static ModuleDescriptor descriptor() throws IOException, URISyntaxException {
        try (InputStream in = Files.newInputStream(root().resolve("module-info.class"))) {
            return ModuleDescriptor.read(in);
        }
    }

    /** Where the compiled library lies: tests run on the class path, so this is a folder. */
    private static Path root() throws URISyntaxException {
        return Path.of(Section.class
                .getProtectionDomain()
                .getCodeSource()
                .getLocation()
                .toURI());
    }

    private static List<String> without(SortedSet<String> some, SortedSet<String> others) {
        return some.stream().filter(name -> !others.contains(name)).toList();
    }
}
