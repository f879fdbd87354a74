package io.github.polewright.live;

import java.util.ArrayList;
import java.util.List;
import org.objectweb.asm.Handle;
import org.objectweb.asm.Label;
import org.objectweb.asm.MethodVisitor;
import org.objectweb.asm.Opcodes;

/** What one method's bytecode does, as far as the audio thread minds. */
final class MethodFacts extends MethodVisitor {

    final int access;

    /** Called methods, {@code owner.name descriptor}. */
    final List<String> calls = new ArrayList<>();

    /** Types of new objects and arrays. */
    final List<String> created = new ArrayList<>();

    /** Bootstrap methods of dynamic calls. */
    final List<String> dynamic = new ArrayList<>();

    boolean locks;
    boolean throwsItself;

    /** The size of the code at most: every instruction counts in its largest encoding. */
    int mostBytes;

    MethodFacts(int access) {
        super(Opcodes.ASM9);
        this.access = access;
        this.locks = (access & Opcodes.ACC_SYNCHRONIZED) != 0;
    }

    @Override
    public void visitInsn(int opcode) {
        mostBytes++;
        locks |= opcode == Opcodes.MONITORENTER;
        throwsItself |= opcode == Opcodes.ATHROW;
    }

    @Override
    public void visitIntInsn(int opcode, int operand) {
        mostBytes += 3;
        if (opcode == Opcodes.NEWARRAY) {
            created.add("array of primitive type " + operand);
        }
    }

    @Override
    public void visitVarInsn(int opcode, int index) {
        mostBytes += 4;
    }

    @Override
    public void visitTypeInsn(int opcode, String type) {
        mostBytes += 3;
        if (opcode == Opcodes.NEW) {
            created.add(type);
        } else if (opcode == Opcodes.ANEWARRAY) {
            created.add("array of " + type);
        }
    }

    @Override
    public void visitMultiANewArrayInsn(String descriptor, int dimensions) {
        mostBytes += 4;
        created.add("array " + descriptor);
    }

    @Override
    public void visitFieldInsn(int opcode, String owner, String name, String descriptor) {
        mostBytes += 3;
    }

    @Override
    public void visitMethodInsn(int opcode, String owner, String name, String descriptor, boolean isInterface) {
        mostBytes += 5;
        calls.add(owner + "." + name + " " + descriptor);
    }

    @Override
    public void visitInvokeDynamicInsn(String name, String descriptor, Handle bootstrap, Object... arguments) {
        mostBytes += 5;
        dynamic.add(bootstrap.getOwner() + "." + bootstrap.getName());
    }

    @Override
    public void visitJumpInsn(int opcode, Label label) {
        mostBytes += 8;
    }

    @Override
    public void visitLdcInsn(Object value) {
        mostBytes += 3;
    }

    @Override
    public void visitIincInsn(int index, int increment) {
        mostBytes += 6;
    }

    @Override
    public void visitTableSwitchInsn(int least, int most, Label otherwise, Label... labels) {
        mostBytes += 16 + 4 * labels.length;
    }

    @Override
    public void visitLookupSwitchInsn(Label otherwise, int[] keys, Label[] labels) {
        mostBytes += 12 + 8 * labels.length;
    }
}
