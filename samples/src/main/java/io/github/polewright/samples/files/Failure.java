package io.github.polewright.samples.files;

/** What keeps a command from doing its work, told to the user in one line. */
public final class Failure extends RuntimeException {

    private static final long serialVersionUID = 1;

    public Failure(String message) {
        super(message);
    }

    public Failure(String message, Throwable cause) {
        super(message, cause);
    }
}
