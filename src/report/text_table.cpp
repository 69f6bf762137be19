#include "report/text_table.hpp"

#include <algorithm>
#include <utility>

namespace rainledger {
namespace {

constexpr std::string_view kBetween = "  ";

std::size_t point_tail(std::string_view number) {
    const std::size_t point = number.find('.');
    return point == std::string_view::npos ? 0 : number.size() - point;
}

bool is_number(std::string_view cell) {
    return cell.find_first_not_of("-0123456789.") == std::string_view::npos &&
           cell.find_first_of("0123456789") != std::string_view::npos;
}

std::vector<std::string> lines_of(std::string_view heading) {
    std::vector<std::string> lines;
    while (true) {
        const std::size_t bar = heading.find('|');
        lines.emplace_back(heading.substr(0, bar));
        if (bar == std::string_view::npos) return lines;
        heading.remove_prefix(bar + 1);
    }
}

/// Up to and with the first comma or semicolon that a blank follows.
std::string_view first_phrase(std::string_view text) {
    for (std::size_t i = 0; i + 1 < text.size(); ++i)
        if ((text[i] == ',' || text[i] == ';') && text[i + 1] == ' ') return text.substr(0, i + 1);
    return text;
}

void append_line(std::string& out, std::string line) {
    line.erase(line.find_last_not_of(' ') + 1);
    out += line;
    out += '\n';
}

}  // namespace

std::size_t shown_width(std::string_view text) {
    return static_cast<std::size_t>(std::count_if(text.begin(), text.end(), [](char c) {
        return (static_cast<unsigned char>(c) & 0xC0U) != 0x80U;
    }));
}

void TextTable::column(std::string_view heading, Align align) {
    columns_.push_back({lines_of(heading), align});
}

void TextTable::row(std::vector<std::string> cells) {
    cells.resize(columns_.size());
    rows_.push_back(std::move(cells));
}

void TextTable::rule() {
    rows_.emplace_back();
}

TextTable::Widths TextTable::widths(std::size_t column) const {
    Widths found;
    std::size_t before_point = 0;
    for (const auto& row : rows_) {
        if (row.empty()) continue;
        const std::string& cell = row[column];
        if (columns_[column].align == Align::point && is_number(cell)) {
            found.after_point = std::max(found.after_point, point_tail(cell));
            before_point = std::max(before_point, cell.size() - point_tail(cell));
        } else {
            found.whole = std::max(found.whole, shown_width(cell));
        }
    }
    found.whole = std::max(found.whole, before_point + found.after_point);
    for (const std::string& line : columns_[column].heading)
        found.whole = std::max(found.whole, shown_width(line));
    return found;
}

std::string TextTable::placed(const std::string& cell, std::size_t column,
                              const Widths& widths) const {
    const Align align = columns_[column].align;
    std::string out = cell;
    if (align == Align::point && is_number(cell))
        out.append(widths.after_point - point_tail(cell), ' ');
    const std::size_t fill = widths.whole - shown_width(out);
    if (align == Align::left) return out.append(fill, ' ');
    return std::string(fill, ' ') + out;
}

std::string TextTable::heading_cell(std::size_t column, std::size_t line, std::size_t lines,
                                    const Widths& widths) const {
    const auto& heading = columns_[column].heading;
    const std::size_t above = lines - heading.size();  // headings end on the last line
    const std::string text = line < above ? std::string() : heading[line - above];
    const std::string fill(widths.whole - shown_width(text), ' ');
    return columns_[column].align == Align::left ? text + fill : fill + text;
}

std::string TextTable::text() const {
    std::vector<Widths> all;
    std::size_t rule_width = 0;
    std::size_t heading_lines = 0;
    for (std::size_t c = 0; c < columns_.size(); ++c) {
        all.push_back(widths(c));
        rule_width += all.back().whole + (c > 0 ? kBetween.size() : 0);
        heading_lines = std::max(heading_lines, columns_[c].heading.size());
    }
    std::string out;
    const auto append_cells = [&](auto&& cell_of) {
        std::string line;
        for (std::size_t c = 0; c < columns_.size(); ++c)
            line.append(kBetween).append(cell_of(c));
        append_line(out, std::move(line));
    };
    for (std::size_t i = 0; i < heading_lines; ++i)
        append_cells([&](std::size_t c) { return heading_cell(c, i, heading_lines, all[c]); });
    const std::string rule = std::string(kBetween) + std::string(rule_width, '-');
    append_line(out, rule);
    for (const auto& row : rows_) {
        if (row.empty())
            append_line(out, rule);
        else
            append_cells([&](std::size_t c) { return placed(row[c], c, all[c]); });
    }
    return out;
}

std::string wrapped(std::string lead, std::string_view text, std::size_t width,
                    std::size_t indent) {
    std::string out = std::move(lead);
    std::size_t used = shown_width(out);
    while (!text.empty()) {
        std::string_view phrase = first_phrase(text);
        text.remove_prefix(phrase.size());
        if (used > indent && used + shown_width(phrase) > width) {
            while (out.ends_with(' '))
                out.pop_back();
            out += '\n';
            out.append(indent, ' ');
            used = indent;
            if (phrase.starts_with(' ')) phrase.remove_prefix(1);
        }
        out += phrase;
        used += shown_width(phrase);
    }
    out += '\n';
    return out;
}

}  // namespace rainledger
