package io.github.polewright.retune;

/** A glide that cannot be certified. The message says which section and why; nothing has been changed. */
public final class RefusedGlideException extends IllegalArgumentException {

    private static final long serialVersionUID = 1L;

    /** The section that could not be certified, or -1 for the cascade as a whole. */
    private final int section;

    RefusedGlideException(int section, String reason) {
        super(section < 0 ? reason : "section " + section + ": " + reason);
        this.section = section;
    }

    /**
     * Which section could not be certified.
     *
     * @return its index, or -1 if the cascade as a whole was refused
     */
    public int section() {
        return section;
    }
}
