//! The `scorchline` binary.

fn main() -> std::process::ExitCode {
    scorchline::cli::main()
}
