using PathPortal.Browser.Tests.Support;

[assembly: AssemblyFixture(typeof(Chromium))]
