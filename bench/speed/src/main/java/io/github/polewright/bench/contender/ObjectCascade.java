package io.github.polewright.bench.contender;

import io.github.polewright.Cascade;
import io.github.polewright.Section;
import io.github.polewright.live.Form;

/**
 * A cascade as it is usually written: an object a section a channel, called sample by sample. No guard against
 * subnormal states, no containment of non-finite samples, no retuning.
 */
public final class ObjectCascade {

    private final int channels;
    private final ObjectSection[][] sections;

    /**
     * Silent.
     *
     * @param cascade what it does
     * @param channels of every frame
     * @param form the arithmetic of its sections
     */
    public ObjectCascade(Cascade cascade, int channels, Form form) {
        this.channels = channels;
        this.sections = new ObjectSection[channels][cascade.sectionCount()];
        for (ObjectSection[] line : sections) {
            for (int i = 0; i < line.length; i++) {
                line[i] = section(cascade.section(i), form);
            }
        }
    }

    private static ObjectSection section(Section section, Form form) {
        return form == Form.DIRECT_FORM_1 ? new ObjectDirectForm1(section) : new ObjectTransposed(section);
    }

    /**
     * Filters interleaved frames from the arrays' start on.
     *
     * @param source interleaved samples
     * @param destination interleaved samples
     * @param frames how many
     */
    public void process(float[] source, float[] destination, int frames) {
        for (int at = 0, end = frames * channels; at < end; ) {
            for (int channel = 0; channel < channels; channel++, at++) {
                destination[at] = (float) next(channel, source[at]);
            }
        }
    }

    /**
     * Filters interleaved frames from the arrays' start on.
     *
     * @param source interleaved samples
     * @param destination interleaved samples
     * @param frames how many
     */
    public void process(double[] source, double[] destination, int frames) {
        for (int at = 0, end = frames * channels; at < end; ) {
            for (int channel = 0; channel < channels; channel++, at++) {
                destination[at] = next(channel, source[at]);
            }
        }
    }

    private double next(int channel, double sample) {
        double value = sample;
        for (ObjectSection section : sections[channel]) {
            value = section.next(value);
        }
        return value;
    }
}
