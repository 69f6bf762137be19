#include "report/json_writer.hpp"

#include <cmath>
#include <cstddef>
#include <cstdint>
#include <utility>

#include "rainledger/base/number.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kReplacement = "\xEF\xBF\xBD";  // U+FFFD

/// What a lead byte announces: how many bytes follow, and the range of the first of them (narrower
/// than 80..BF where overlong forms, surrogates and values past U+10FFFF begin). Unicode Standard,
/// table 3-7, "Well-formed UTF-8 byte sequences", from memory.
struct Sequence {
    std::size_t following = 0;  // 0: no lead byte of a sequence
    unsigned lowest = 0x80U;
    unsigned highest = 0xBFU;
};

Sequence sequence_of(unsigned lead) {
    if (lead >= 0xC2U && lead <= 0xDFU) return {1};
    if (lead == 0xE0U) return {2, 0xA0U, 0xBFU};
    if (lead == 0xEDU) return {2, 0x80U, 0x9FU};
    if (lead >= 0xE1U && lead <= 0xEFU) return {2};
    if (lead == 0xF0U) return {3, 0x90U, 0xBFU};
    if (lead >= 0xF1U && lead <= 0xF3U) return {3};
    if (lead == 0xF4U) return {3, 0x80U, 0x8FU};
    return {};
}

unsigned byte_at(std::string_view text, std::size_t i) {
    return static_cast<unsigned char>(text[i]);
}

/// Length of the well-formed UTF-8 sequence of two to four bytes at `begin`; 0 if there is none.
std::size_t sequence_length(std::string_view text, std::size_t begin) {
    const Sequence sequence = sequence_of(byte_at(text, begin));
    if (sequence.following == 0 || begin + sequence.following >= text.size()) return 0;
    const unsigned second = byte_at(text, begin + 1);
    if (second < sequence.lowest || second > sequence.highest) return 0;
    for (std::size_t i = begin + 2; i <= begin + sequence.following; ++i)
        if ((byte_at(text, i) & 0xC0U) != 0x80U) return 0;
    return sequence.following + 1;
}

void append_escaped(std::string& out, char c) {
    constexpr std::string_view kDigits = "0123456789abcdef";
    switch (c) {
        case '"':
            out += "\\\"";
            return;
        case '\\':
            out += "\\\\";
            return;
        case '\n':
            out += "\\n";
            return;
        case '\t':
            out += "\\t";
            return;
        default:
            break;
    }
    const auto byte = static_cast<unsigned char>(c);
    if (byte >= 0x20U) {
        out += c;
        return;
    }
    out += "\\u00";
    out += kDigits[byte >> 4U];
    out += kDigits[byte & 0x0FU];
}

}  // namespace

void append_json_string(std::string& out, std::string_view text) {
    out += '"';
    for (std::size_t i = 0; i < text.size();) {
        if (byte_at(text, i) < 0x80U) {
            append_escaped(out, text[i]);
            ++i;
            continue;
        }
        const std::size_t length = sequence_length(text, i);
        out += length > 0 ? text.substr(i, length) : kReplacement;
        i += length > 0 ? length : 1;
    }
    out += '"';
}

void JsonWriter::new_line() {
    out_ += '\n';
    out_.append(2 * has_members_.size(), ' ');
}

void JsonWriter::begin_value() {
    if (std::exchange(after_key_, false) || has_members_.empty()) return;
    if (has_members_.back()) out_ += ',';
    has_members_.back() = true;
    new_line();
}

void JsonWriter::raw(std::string_view text) {
    begin_value();
    out_ += text;
}

void JsonWriter::open(char bracket) {
    begin_value();
    out_ += bracket;
    has_members_.push_back(false);
}

void JsonWriter::close(char bracket) {
    const bool had_members = has_members_.back();
    has_members_.pop_back();
    if (had_members) new_line();
    out_ += bracket;
}

void JsonWriter::key(std::string_view name) {
    begin_value();
    append_json_string(out_, name);
    out_ += ": ";
    after_key_ = true;
}

void JsonWriter::value(std::string_view text) {
    begin_value();
    append_json_string(out_, text);
}

void JsonWriter::value(double number) {
    if (!std::isfinite(number)) {
        null();
        return;
    }
    begin_value();
    append_shortest(out_, number + 0.0);  // a negative zero loses its sign
}

std::string JsonWriter::take() && {
    out_ += '\n';
    return std::move(out_);
}

}  // namespace rainledger
