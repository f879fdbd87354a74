package io.github.polewright.live;

import java.io.IOException;
import java.io.InputStream;
import java.util.ArrayDeque;
import java.util.ArrayList;
import java.util.Deque;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Objects;
import java.util.SortedMap;
import java.util.TreeMap;
import org.objectweb.asm.ClassReader;
import org.objectweb.asm.ClassVisitor;
import org.objectweb.asm.MethodVisitor;
import org.objectweb.asm.Opcodes;

/**
 * Reads class files from some methods on, through every call into this project, and keeps what each method does.
 * Methods are named {@code owner.name descriptor}, with slashes.
 */
final class BytecodeWalk {

    private static final String PROJECT = "io/github/polewright/";

    private final Map<String, Map<String, MethodFacts>> classes = new HashMap<>();
    private final Map<String, String> supers = new HashMap<>();
    private final SortedMap<String, MethodFacts> reached = new TreeMap<>();
    private final List<String> unresolved = new ArrayList<>();

    private BytecodeWalk() {}

    /** Walks from all methods of that name in that class. */
    static BytecodeWalk from(Class<?> type, String... names) throws IOException {
        BytecodeWalk walk = new BytecodeWalk();
        String owner = type.getName().replace('.', '/');
        Deque<String> open = new ArrayDeque<>();
        for (String method : walk.methods(owner).keySet()) {
            for (String name : names) {
                if (method.startsWith(name + " ")) {
                    open.add(owner + "." + method);
                }
            }
        }
        while (!open.isEmpty()) {
            String method = open.remove();
            if (!walk.reached.containsKey(method)) {
                MethodFacts facts = walk.resolve(method);
                walk.reached.put(method, facts);
                facts.calls.stream().filter(call -> call.startsWith(PROJECT)).forEach(open::add);
            }
        }
        return walk;
    }

    /** What every reached method does. */
    SortedMap<String, MethodFacts> reached() {
        return reached;
    }

    /** Calls that the class files do not settle: abstract methods and native ones. */
    List<String> unresolved() {
        return unresolved;
    }

    private MethodFacts resolve(String method) throws IOException {
        int dot = method.indexOf('.');
        String name = method.substring(dot + 1);
        for (String owner = method.substring(0, dot); owner.startsWith(PROJECT); owner = supers.get(owner)) {
            MethodFacts facts = methods(owner).get(name);
            if (facts != null) {
                if ((facts.access & (Opcodes.ACC_ABSTRACT | Opcodes.ACC_NATIVE)) != 0) {
                    unresolved.add(method);
                }
                return facts;
            }
        }
        unresolved.add(method);
        return new MethodFacts(0);
    }

    private Map<String, MethodFacts> methods(String owner) throws IOException {
        if (!classes.containsKey(owner)) {
            Map<String, MethodFacts> methods = new HashMap<>();
            try (InputStream file = BytecodeWalk.class.getResourceAsStream("/" + owner + ".class")) {
                ClassReader reader = new ClassReader(Objects.requireNonNull(file, owner));
                supers.put(owner, reader.getSuperName());
                reader.accept(
                        new ClassVisitor(Opcodes.ASM9) {
                            @Override
                            public MethodVisitor visitMethod(
                                    int access, String name, String descriptor, String signature, String[] thrown) {
                                MethodFacts facts = new MethodFacts(access);
                                methods.put(name + " " + descriptor, facts);
                                return facts;
                            }
                        },
                        ClassReader.SKIP_DEBUG | ClassReader.SKIP_FRAMES);
            }
            classes.put(owner, methods);
        }
        return classes.get(owner);
    }
}
