package io.github.polewright.samples.command;

import io.github.polewright.samples.files.Recording;
import java.util.function.LongConsumer;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import org.jspecify.annotations.Nullable;

/** A bar on standard error while a long recording is worked on, if somebody sits at a terminal. */
final class Progress implements LongConsumer, AutoCloseable {

    private static final double LONG_SECONDS = 60;

    private final @Nullable ProgressBar bar;
    private final double sampleRateHz;

    private Progress(@Nullable ProgressBar bar, double sampleRateHz) {
        this.bar = bar;
        this.sampleRateHz = sampleRateHz;
    }

    // Main sees to it that there is a console only at a terminal.
    @SuppressWarnings("SystemConsoleNull")
    static Progress of(String task, Recording recording) {
        boolean wanted = System.console() != null && recording.seconds() > LONG_SECONDS;
        ProgressBar bar = wanted
                ? new ProgressBarBuilder()
                        .setTaskName(task)
                        .setInitialMax((long) recording.seconds())
                        .setUnit(" s", 1)
                        .setUpdateIntervalMillis(200)
                        .build()
                : null;
        return new Progress(bar, recording.sampleRateHz());
    }

    @Override
    public void accept(long framesDone) {
        if (bar != null) {
            bar.stepTo((long) (framesDone / sampleRateHz));
        }
    }

    @Override
    public void close() {
        if (bar != null) {
            bar.close();
        }
    }
}
