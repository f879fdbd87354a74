/** Survey and clean recordings on the command line: a consumer of the core like any other. */
@SuppressWarnings("requires-automatic")
module io.github.polewright.samples {
    requires com.google.gson;
    requires info.picocli;
    requires io.github.polewright;
    requires java.desktop;
    requires java.xml;
    requires JTransforms;
    requires me.tongfei.progressbar;
    requires org.apache.xmlgraphics.batik.svggen;
    requires static org.jspecify;
    requires org.knowm.xchart;

    opens io.github.polewright.samples.command to
            info.picocli;
    opens io.github.polewright.samples.survey to
            com.google.gson;
    opens io.github.polewright.samples.tones to
            com.google.gson;
}
