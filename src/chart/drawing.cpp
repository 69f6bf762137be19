#include "chart/drawing.hpp"

#include <algorithm>
#include <cstddef>
#include <span>
#include <utility>

#include <fmt/core.h>

namespace rainledger {
namespace {

std::string_view align_word(Align align) {
    switch (align) {
        case Align::left:
            return "left";
        case Align::centre:
            return "center";
        case Align::right:
            return "right";
    }
    return "left";
}

/// Terminals differ in what a length is; each is set up so that one page unit means one page unit.
std::string terminal(ChartFormat format, double height) {
    constexpr double kCmPerUnit = 2.54 / 96.0;
    constexpr double kPointsPerUnit = 72.0 / 96.0;
    const double pixels = kPagePixels / kPageWidth;
    switch (format) {
        case ChartFormat::svg:
            return fmt::format(
                "set terminal svg noenhanced size {:g},{:g} fixed font 'sans-serif,{:g}' "
                "linewidth 1 background rgb '{}'\n",
                kPageWidth, height, kTextSize, kPaper);
        case ChartFormat::png:
            return fmt::format(
                "set terminal pngcairo noenhanced size {:g},{:.0f} font 'sans-serif,{:g}' "
                "fontscale {:.4f} linewidth {:.4f} background rgb '{}'\n",
                kPagePixels, height * pixels, kTextSize, kPointsPerUnit * pixels, pixels, kPaper);
        case ChartFormat::pdf:
            return fmt::format(
                "set terminal pdfcairo noenhanced size {:.4f}cm,{:.4f}cm font 'sans-serif,{:g}' "
                "fontscale {:g} linewidth 1.5 background rgb '{}'\n",
                kPageWidth * kCmPerUnit, height * kCmPerUnit, kTextSize,
                kPointsPerUnit * kPointsPerUnit, kPaper);
        case ChartFormat::text:
            break;
    }
    return {};
}

std::string tick_list(const Axis& axis) {
    std::string out;
    for (const Tick& tick : axis.ticks) {
        out += fmt::format("{}{} {:.7g}", out.empty() ? "" : ", ",
                           quoted(axis.labelled ? tick.label : ""), tick.at);
    }
    return out;
}

std::string range_and_ticks(std::string_view name, const Axis& axis, double tick_length) {
    std::string out =
        fmt::format("set {}range [{:.7g}:{:.7g}] noextend\n", name, axis.from, axis.to);
    if (axis.ticks.empty()) return out + fmt::format("unset {}tics\n", name);
    return out +
           fmt::format("set {}tics out nomirror scale {:g} textcolor rgb '{}' font ',{:g}' ({})\n",
                       name, tick_length, kQuiet, kTextSize - 1.0, tick_list(axis));
}

Layer guides(const Panel& panel) {
    std::string rows;
    for (const Tick& tick : panel.y.ticks)
        append_row(rows, {panel.x.from, tick.at, panel.x.to, tick.at});
    return strokes(std::move(rows), kGuide, kThinLine);
}

/// The axis along which the panel's columns stand: at the foot, or at the top where they hang. It
/// also keeps gnuplot content where nothing else is to be drawn.
Layer axis_line(const Panel& panel) {
    std::string rows;
    append_row(rows, {panel.x.from, 0.0, panel.x.to, 0.0});
    return strokes(std::move(rows), kAxis, kThinLine);
}

std::string margins(const Box& box, double height) {
    return fmt::format(
        "set lmargin at screen {:.6f}\nset rmargin at screen {:.6f}\n"
        "set bmargin at screen {:.6f}\nset tmargin at screen {:.6f}\n",
        box.left / kPageWidth, box.right / kPageWidth, box.bottom / height, box.top / height);
}

std::string plot(const std::vector<const Layer*>& layers, std::size_t on_left) {
    std::string data;
    std::string command;
    for (std::size_t i = 0; i < layers.size(); ++i) {
        if (layers[i]->rows.empty()) continue;
        data += fmt::format("$d{} << end\n{}end\n", i, layers[i]->rows);
        command += fmt::format("{}$d{} {} axes x1{} notitle", command.empty() ? "plot " : ", ", i,
                               layers[i]->style, i < on_left ? "y1" : "y2");
    }
    return data + command + "\n";
}

std::string panel_script(const Panel& panel, double height) {
    constexpr double kTickLength = 0.35;  // of gnuplot's own
    std::string out = margins(panel.box, height);
    out += range_and_ticks("x", panel.x, panel.x.labelled ? kTickLength : 0.0);
    out += range_and_ticks("y", panel.y, 0.0);
    if (panel.right) {
        out += range_and_ticks("y2", *panel.right, 0.0);
    } else {
        out += "unset y2tics\n";
    }
    const Layer across = guides(panel);
    const Layer foot = axis_line(panel);
    std::vector<const Layer*> layers;
    if (panel.guides) layers.push_back(&across);
    for (const Layer& layer : panel.layers)
        layers.push_back(&layer);
    if (panel.axis) layers.push_back(&foot);
    const std::size_t on_left = layers.size();
    for (const Layer& layer : panel.right_layers)
        layers.push_back(&layer);
    return out + plot(layers, on_left);
}

/// Along the top of a stretch and back along its foot.
void append_outline(std::string& rows, std::span<const Span> spans) {
    if (!rows.empty()) rows += '\n';
    for (const Span& span : spans)
        append_row(rows, {span.at, span.high});
    for (std::size_t i = spans.size(); i-- > 0;)
        append_row(rows, {spans[i].at, spans[i].low});
}

}  // namespace

void append_row(std::string& rows, std::initializer_list<double> numbers) {
    std::string_view blank;
    for (const double number : numbers) {
        rows += fmt::format("{}{:.7g}", blank, number);
        blank = " ";
    }
    rows += '\n';
}

Layer area(const std::vector<Span>& spans, std::string_view colour) {
    Layer layer;
    layer.style = fmt::format(
        "using 1:2 with filledcurves closed fillstyle solid 1 noborder fillcolor rgb '{}'", colour);
    const auto thick = [](const Span& span) { return span.high > span.low; };
    for (std::size_t i = 0; i < spans.size();) {
        if (!thick(spans[i])) {
            ++i;
            continue;
        }
        const std::size_t first = i > 0 ? i - 1 : i;
        while (i < spans.size() && thick(spans[i]))
            ++i;
        append_outline(
            layer.rows,
            {spans.begin() + static_cast<std::ptrdiff_t>(first),
             spans.begin() + static_cast<std::ptrdiff_t>(std::min(i + 1, spans.size()))});
    }
    return layer;
}

Layer line(std::string rows, std::string_view colour, double width, bool dashed) {
    return {std::move(rows), fmt::format("using 1:2 with lines linewidth {:g} dashtype {} "
                                         "linecolor rgb '{}'",
                                         width, dashed ? "(6,4)" : "solid", colour)};
}

Layer strokes(std::string rows, std::string_view colour, double width) {
    return {std::move(rows), fmt::format("using 1:2:($3-$1):($4-$2) with vectors nohead "
                                         "linewidth {:g} dashtype solid linecolor rgb '{}'",
                                         width, colour)};
}

void Drawing::text(double x, double y, std::string_view words, const TextStyle& style) {
    words_ += fmt::format(
        "set label {} at screen {:.6f},{:.6f} {} front noenhanced font '{},{:g}' "
        "textcolor rgb '{}'\n",
        quoted(words), x / kPageWidth, y / height_, align_word(style.align),
        style.bold ? "sans-serif:Bold" : "sans-serif", style.size, style.colour);
}

void Drawing::swatch(const Box& box, std::string_view colour) {
    words_ += fmt::format(
        "set object rectangle from screen {:.6f},{:.6f} to screen {:.6f},{:.6f} front "
        "fillstyle solid 1 border rgb '{}' linewidth 0.5 fillcolor rgb '{}'\n",
        box.left / kPageWidth, box.bottom / height_, box.right / kPageWidth, box.top / height_,
        kAxis, colour);
}

void Drawing::dash(double left, double right, double y, std::string_view colour, double width,
                   bool dashed) {
    words_ += fmt::format(
        "set arrow from screen {:.6f},{:.6f} to screen {:.6f},{:.6f} nohead front "
        "linewidth {:g} dashtype {} linecolor rgb '{}'\n",
        left / kPageWidth, y / height_, right / kPageWidth, y / height_, width,
        dashed ? "(6,4)" : "solid", colour);
}

std::string Drawing::script(ChartFormat format) const {
    std::string out = "set encoding utf8\n" + terminal(format, height_) +
                      "unset key\nset border 0 linecolor rgb '" + std::string(kAxis) +
                      "' linewidth 0.8\nset multiplot\n";
    for (std::size_t i = 0; i < panels_.size(); ++i) {
        // Words stand in front of every panel, so they come with the last.
        if (i + 1 == panels_.size()) out += words_;
        out += panel_script(panels_[i], height_);
    }
    return out + "unset multiplot\n";
}

}  // namespace rainledger
