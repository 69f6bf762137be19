#include <algorithm>
#include <cstddef>

#include "report/lookup_parts.hpp"
#include "report/text_table.hpp"

// Several rows of published tables, one line each; what is said of them stands below, by number,
// and where they come from, by letter.
namespace rainledger {
namespace {

constexpr std::string_view kHang = "      ";
constexpr std::size_t kWidestHeading = 14;
constexpr std::size_t kNarrowestName = 12;

/// Texts that rows share, each with the mark of its first appearance.
class Marked {
public:
    /// The place of the text in the list, which takes it in if it is new.
    std::size_t place(const std::string& text) {
        const auto found = std::ranges::find(texts_, text);
        if (found != texts_.end()) return static_cast<std::size_t>(found - texts_.begin());
        texts_.push_back(text);
        return texts_.size() - 1;
    }
    [[nodiscard]] const std::vector<std::string>& texts() const { return texts_; }

private:
    std::vector<std::string> texts_;
};

std::string letter(std::size_t place) {
    constexpr std::size_t kLetters = 26;
    std::string out(1, static_cast<char>('a' + place % kLetters));
    return place < kLetters ? out : letter(place / kLetters - 1) + out;
}

std::string number(std::size_t place) {
    return std::to_string(place + 1);
}

const ValueView* find_value(const RowView& row, std::string_view key) {
    const auto found = std::ranges::find(row.values, key, &ValueView::key);
    return found == row.values.end() ? nullptr : &*found;
}

bool is_full(const RowView& row) {
    return std::ranges::all_of(row.values, [](const ValueView& view) {
        return view.published.value || view.published.range;
    });
}

/// One value per key that any row has, with the words of a full row where there is one.
std::vector<ValueView> columns_of(const std::vector<RowView>& rows) {
    std::vector<ValueView> columns;
    for (const RowView& row : rows)
        for (const ValueView& view : row.values)
            if (std::ranges::find(columns, view.key, &ValueView::key) == columns.end())
                columns.push_back(view);
    const auto full = std::ranges::find_if(rows, is_full);
    if (full == rows.end()) return columns;
    for (ValueView& column : columns)
        if (const ValueView* view = find_value(*full, column.key)) column = *view;
    return columns;
}

/// The label broken into short lines, and the unit below.
std::string heading_of(const ValueView& view, const Display& display) {
    std::string out;
    std::size_t used = 0;
    for (std::string_view rest = view.label; !rest.empty();) {
        const std::string_view word = rest.substr(0, rest.find(' '));
        rest.remove_prefix(std::min(word.size() + 1, rest.size()));
        if (used > 0 && used + 1 + word.size() > kWidestHeading) {
            out += '|';
            used = 0;
        }
        if (used > 0) out += ' ';
        out += word;
        used += word.size() + 1;
    }
    if (!view.dimension) return out;
    const std::string zero = display.parameter(0.0, *view.dimension);
    return out + "|" + zero.substr(zero.find(' ') + 1);
}

std::string bare(double canonical, const ValueView& view, const Display& display) {
    const std::string shown = shown_value(canonical, view, display);
    return shown.substr(0, shown.find(' '));
}

std::string cell_of(const ValueView* view, const Display& display) {
    if (view == nullptr) return {};
    std::string out;
    if (view->published.value) out = bare(*view->published.value, *view, display);
    if (const auto& range = view->published.range) {
        const std::string ends =
            bare(range->low, *view, display) + "-" + bare(range->high, *view, display);
        out += out.empty() ? ends : " (" + ends + ")";
    }
    return view->fault ? out + "*" : out;
}

/// A note that every row has says itself once, without a mark.
std::vector<std::string_view> notes_of_all(const std::vector<RowView>& rows) {
    std::vector<std::string_view> shared;
    for (const std::string_view note : rows.front().notes)
        if (std::ranges::all_of(rows, [&](const RowView& row) {
                return std::ranges::find(row.notes, note) != row.notes.end();
            }))
            shared.push_back(note);
    return shared;
}

struct Line {
    std::string name;
    std::vector<std::string> cells;
};

/// Everything that the table shows, before it is laid out.
struct Contents {
    std::vector<ValueView> columns;
    std::vector<Line> lines;
    std::vector<std::string_view> shared_notes;
    Marked notes;
    Marked sources;
    bool one_source = false;
};

void add_mark(std::string& marks, const std::string& mark) {
    marks += (marks.empty() ? "" : ",") + mark;
}

std::string note_marks(const RowView& row, Contents& contents, const Display& display) {
    std::string marks;
    for (const ValueView& view : row.values)
        if (view.fault)
            add_mark(marks,
                     number(contents.notes.place("* " + row.name + ", " + std::string(view.label) +
                                                 ": " + fault_words(view, display))));
    for (const std::string_view note : row.notes)
        if (std::ranges::find(contents.shared_notes, note) == contents.shared_notes.end())
            add_mark(marks, number(contents.notes.place(std::string(note))));
    return marks;
}

Contents contents_of(const std::vector<RowView>& rows, const Display& display) {
    Contents contents;
    contents.columns = columns_of(rows);
    contents.shared_notes = notes_of_all(rows);
    for (const RowView& row : rows) {
        Line line{row.name, {}};
        for (const ValueView& column : contents.columns)
            line.cells.push_back(cell_of(find_value(row, column.key), display));
        line.cells.push_back(note_marks(row, contents, display));
        line.cells.push_back(letter(contents.sources.place(citation(row.provenance))));
        contents.lines.push_back(std::move(line));
    }
    contents.one_source = contents.sources.texts().size() == 1;
    return contents;
}

/// A name cut at blanks into pieces of at most `width`.
std::vector<std::string> pieces(const std::string& name, std::size_t width) {
    std::vector<std::string> out{""};
    for (std::string_view rest = name; !rest.empty();) {
        const std::string_view word = rest.substr(0, rest.find(' '));
        rest.remove_prefix(std::min(word.size() + 1, rest.size()));
        if (!out.back().empty() && out.back().size() + 1 + word.size() > width)
            out.emplace_back("  ");
        else if (!out.back().empty())
            out.back() += ' ';
        out.back() += word;
    }
    return out;
}

bool holds_range(const Contents& contents, std::size_t column) {
    return std::ranges::any_of(contents.lines, [&](const Line& line) {
        return line.cells[column].find('-') != std::string::npos;
    });
}

std::string laid_out(const Contents& contents, std::size_t name_width, const Display& display) {
    TextTable table;
    table.column("", Align::left);
    for (std::size_t i = 0; i < contents.columns.size(); ++i)
        table.column(heading_of(contents.columns[i], display),
                     holds_range(contents, i) ? Align::left : Align::point);
    const bool has_notes = !contents.notes.texts().empty();
    if (has_notes) table.column("note", Align::left);
    if (!contents.one_source) table.column("source", Align::left);
    for (const Line& line : contents.lines) {
        const auto parts = pieces(line.name, name_width);
        std::vector<std::string> cells{parts.front()};
        for (std::size_t i = 0; i < contents.columns.size(); ++i)
            cells.push_back(line.cells[i]);
        if (has_notes) cells.push_back(line.cells[contents.columns.size()]);
        if (!contents.one_source) cells.push_back(line.cells.back());
        table.row(std::move(cells));
        for (std::size_t i = 1; i < parts.size(); ++i)
            table.row({parts[i]});
    }
    return table.text();
}

std::size_t widest_line(std::string_view text) {
    std::size_t widest = 0;
    while (!text.empty()) {
        const std::size_t end = text.find('\n');
        widest = std::max(widest, shown_width(text.substr(0, end)));
        text.remove_prefix(end + 1);
    }
    return widest;
}

/// The names give way where the page is too narrow.
std::string fitted(const Contents& contents, const Display& display) {
    std::size_t widest_name = 0;
    for (const Line& line : contents.lines)
        widest_name = std::max(widest_name, line.name.size());
    std::string text = laid_out(contents, widest_name, display);
    const std::size_t width = widest_line(text);
    if (width <= kLookupWidth) return text;
    const std::size_t excess = std::min(width - kLookupWidth, widest_name);
    return laid_out(contents, std::max(kNarrowestName, widest_name - excess), display);
}

}  // namespace

std::string table_text(const std::vector<RowView>& rows, const Display& display) {
    const Contents contents = contents_of(rows, display);
    std::string out = fitted(contents, display);
    for (const std::string_view note : contents.shared_notes)
        out += filled("  Note: ", note, kHang);
    const auto& notes = contents.notes.texts();
    for (std::size_t i = 0; i < notes.size(); ++i)
        out += filled("  Note " + number(i) + ": ", notes[i], kHang);
    const auto& sources = contents.sources.texts();
    if (contents.one_source) return out + filled("  Source: ", sources.front(), kHang);
    for (std::size_t i = 0; i < sources.size(); ++i)
        out += filled("  Source " + letter(i) + ": ", sources[i], kHang);
    return out;
}

}  // namespace rainledger
