#include "chart/finished_svg.hpp"

#include <cstddef>

#include "chart/words.hpp"

namespace rainledger {
namespace {

void replace_all(std::string& text, std::string_view from, std::string_view to) {
    for (std::size_t at = text.find(from); at != std::string::npos;
         at = text.find(from, at + to.size()))
        text.replace(at, from.size(), to);
}

std::string escaped(std::string_view words) {
    std::string out;
    for (const char c : shown_words(words)) {
        if (c == '&') {
            out += "&amp;";
        } else if (c == '<') {
            out += "&lt;";
        } else if (c == '>') {
            out += "&gt;";
        } else {
            out += c;
        }
    }
    return out;
}

/// Only in the attributes of groups: words stand on lines of their own.
void embolden(std::string& svg) {
    constexpr std::string_view kGroup = "<g transform=";
    constexpr std::string_view kNamed = "font-family=\"sans-serif:Bold\"";
    constexpr std::string_view kBold = "font-family=\"sans-serif\" font-weight=\"bold\"";
    for (std::size_t at = svg.find(kGroup); at != std::string::npos; at = svg.find(kGroup, at)) {
        const std::size_t end = svg.find('\n', at);
        const std::size_t named = svg.find(kNamed, at);
        if (named < end) svg.replace(named, kNamed.size(), kBold);
        at = end;
    }
}

/// gnuplot's own names of plots, which viewers would show beside the pointer.
void drop_plot_names(std::string& svg) {
    constexpr std::string_view kName = "<title>gnuplot_plot_";
    constexpr std::string_view kEnd = "</title>";
    for (std::size_t at = svg.find(kName); at != std::string::npos; at = svg.find(kName, at))
        svg.erase(at, svg.find(kEnd, at) + kEnd.size() - at);
}

}  // namespace

std::string finished_svg(std::string svg, std::string_view title) {
    constexpr std::string_view kGiven = "<title>Gnuplot</title>";
    replace_all(svg, "]]>", "]]&gt;");
    embolden(svg);
    drop_plot_names(svg);
    const std::size_t at = svg.find(kGiven);
    if (at != std::string::npos)
        svg.replace(at, kGiven.size(), "<title>" + escaped(title) + "</title>");
    return svg;
}

}  // namespace rainledger
