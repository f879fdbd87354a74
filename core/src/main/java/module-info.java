/**
 * Real-time audio filtering in cascades of second-order sections: design them, inspect them, run them inside an
 * audio callback, and retune them while they run. No runtime dependency.
 */
module io.github.polewright {
    requires static org.jspecify;

    exports io.github.polewright;
    exports io.github.polewright.mains;
    exports io.github.polewright.pcm;
    exports io.github.polewright.design;
    exports io.github.polewright.inspect;
    exports io.github.polewright.live;
    exports io.github.polewright.retune;
    exports io.github.polewright.tone;
}
